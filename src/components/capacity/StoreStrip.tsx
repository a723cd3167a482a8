import { useMemo } from 'react';
import type { Carried } from '@/core/header/carry';
import { fromMinutes } from '@/core/time/stepFunction';
import { useUnits } from '../ui/units';
import { areaPath, linePath, type DeskScale } from './scale';

interface Props {
  readonly scale: DeskScale;
  readonly carried: Carried;
}

/** What is in store in the accumulators over the week. */
export function StoreStrip({ scale, carried }: Props) {
  const units = useUnits();
  const steps = useMemo(() => fromMinutes(carried.storeKg.map((kg) => Math.round(kg))), [carried.storeKg]);
  const own = { ...scale, topKgPerH: Math.max(1, carried.capacityKg * 1.1) };
  const least = Math.min(...carried.storeKg);
  return (
    <svg
      width={scale.width}
      height={scale.height}
      className="block"
      role="img"
      aria-label={`Steam in store: ${units.text('mass', carried.capacityKg)} when full, ${units.text('mass', least)} at the least`}
    >
      <path d={areaPath(own, steps)} className="fill-steam-deep opacity-25" />
      <path d={linePath(own, steps)} className="fill-none stroke-steam-deep" strokeWidth={1} />
    </svg>
  );
}
