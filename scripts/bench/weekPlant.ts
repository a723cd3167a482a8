import type { CleaningRule, PlantModel, Unit, UnitKind } from '@/core/plant/plant';
import type { Step } from '@/core/time/stepFunction';

export const DAY = 1440;
export const FAMILIES = ['A', 'B', 'C', 'D'];

/** Minutes of cleaning from one family (row) to another (column). Invented. */
export const CLEANING: Readonly<Record<string, readonly (readonly number[])[]>> = {
  blancher: [
    [0, 10, 20, 30],
    [10, 0, 20, 30],
    [15, 15, 0, 30],
    [40, 40, 40, 0],
  ],
  kettle: [
    [0, 15, 20, 40],
    [15, 0, 20, 40],
    [20, 20, 0, 40],
    [45, 45, 45, 0],
  ],
  retort: [
    [5, 5, 5, 10],
    [5, 5, 5, 10],
    [5, 5, 5, 10],
    [10, 10, 10, 5],
  ],
};

/** The limit, lower around noon and on some evenings. [kg/h] */
export function limitOf(base: number, days: number): Step[] {
  const steps: Step[] = [{ from: 0, value: base }];
  for (let day = 0; day <= days; day++) {
    const noon = day * DAY + 720;
    steps.push({ from: noon, value: Math.round(base * 0.8) }, { from: noon + 90, value: base });
    if (day % 2 === 0) continue;
    steps.push({ from: day * DAY + 1080, value: Math.round(base * 0.85) }, { from: day * DAY + 1320, value: base });
  }
  return steps;
}

/** Operators at hand, fewer at night. */
export function operators(days: number): Step[] {
  const steps: Step[] = [{ from: 0, value: 4 }];
  for (let day = 0; day <= days; day++) {
    steps.push({ from: day * DAY + 1080, value: 3 }, { from: (day + 1) * DAY + 300, value: 4 });
  }
  return steps;
}

/** An invented plant around the units. */
export function plantOf(units: Unit[], operatorSteps: Step[]): PlantModel {
  return {
    id: 'bench',
    name: 'Generated plant',
    isDemo: true,
    ambientBarA: 1.01325,
    rules: { snapMinutes: 5, reserveFraction: 0, sagToleranceBar: 1 },
    lines: [{ id: 'line', name: 'Line' }],
    units,
    ventGroups: [],
    headers: [
      { id: 'main', name: 'Main', pressureBarG: 7, dryness: 0.98, superheatK: null, feed: { kind: 'boilers' } },
    ],
    sharedLimits: [{ id: 'operators', name: 'Operators', unit: 'people', capacity: operatorSteps }],
    cleaning: cleaningRules(),
  };
}

function cleaningRules(): CleaningRule[] {
  return Object.entries(CLEANING).flatMap(([kind, rows]) =>
    rows.flatMap((row, from) =>
      row.map((minutes, to): CleaningRule => ({
        unitKind: kind as UnitKind,
        fromFamilyId: FAMILIES[from] as string,
        toFamilyId: FAMILIES[to] as string,
        minutes,
        kind: 'wash',
        phases: [],
        uses: [],
      })),
    ),
  );
}
