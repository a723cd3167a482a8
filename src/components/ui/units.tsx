import { createContext, useContext, type ReactNode } from 'react';
import type { UnitSystem } from '../../core/quantity/display';
import { unitsOf, type Units } from '../units';

const UnitsContext = createContext<Units>(unitsOf('si'));

interface Props {
  /** As the page gives it: the person's choice, else the plant's. Server and browser draw from the same prop. */
  readonly system: UnitSystem;
  readonly children: ReactNode;
}

/** The units of everything inside an island. */
export function UnitsProvider({ system, children }: Props) {
  return <UnitsContext.Provider value={unitsOf(system)}>{children}</UnitsContext.Provider>;
}

/** The units in which figures are read and typed here. */
export const useUnits = (): Units => useContext(UnitsContext);
