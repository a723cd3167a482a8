import { useState } from 'react';
import type { OwnSettings, PlantSettingsDto } from '@/contracts/settings';
import { UnitsProvider } from '../ui/units';
import { OwnForm } from './OwnForm';
import { PlantFacts } from './PlantFacts';
import { PlantForm } from './PlantForm';

interface SettingsProps {
  readonly own: OwnSettings;
  readonly plant: PlantSettingsDto;
  readonly plantName: string;
  readonly canSet: boolean;
  /** 'Only an administrator of ... may do this.' */
  readonly whoMay: string;
}

/** A person's own settings and those of the plant. What is saved shows at once, figures here included. */
export function Settings({ plantName, canSet, whoMay, ...first }: SettingsProps) {
  const [own, setOwn] = useState(first.own);
  const [plant, setPlant] = useState(first.plant);
  return (
    <UnitsProvider system={own.units ?? plant.values.units}>
      <div className="grid gap-x-16 gap-y-12 lg:grid-cols-[minmax(0,20rem)_minmax(0,36rem)]">
        <section aria-labelledby="own-settings">
          <h2 id="own-settings" className="mb-4 text-lg">
            Your own
          </h2>
          <OwnForm own={own} plantUnits={plant.values.units} onSaved={setOwn} />
        </section>
        <section aria-labelledby="plant-settings">
          <h2 id="plant-settings" className="mb-4 text-lg">
            {plantName}
          </h2>
          {canSet ? <PlantForm plant={plant} onSaved={setPlant} /> : <PlantFacts plant={plant} whoMay={whoMay} />}
        </section>
      </div>
    </UnitsProvider>
  );
}
