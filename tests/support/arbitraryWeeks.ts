import fc from 'fast-check';
import type { DutyPhase } from '@/core/duty/duty';
import type { Activity, Mode } from '@/core/plant/activity';
import type { PlantModel } from '@/core/plant/plant';
import type { Week } from '@/core/schedule/week';
import { activity, capacity, header, link, phase, plant, unit, ventGroup, week } from './builders';

const UNITS = ['r1', 'r2', 'r3', 'k1', 'k2', 'low1'];
/** Short, so that cases stay quick and activities meet. */
export const SHORT_WEEK_MIN = 1440;

const smallPlant: PlantModel = plant({
  rules: {
    snapMinutes: 5,
    reserveFraction: 0,
    sagToleranceBar: 0.5,
    practice: { greatestRunningMin: 90, greatestStandingDirtyMin: 300, allergenReleaseMin: 200 },
  },
  units: [
    ...['r1', 'r2', 'r3'].map((id) => unit(id, { kind: 'retort', ventGroupId: 'group' })),
    ...['k1', 'k2'].map((id) => unit(id, { kind: 'kettle', lineId: 'line2' })),
    unit('low1', { kind: 'kettle', headerId: 'low' }),
  ],
  lines: [1, 2].map((n) => ({ id: `line${n}`, name: `Line ${n}` })),
  headers: [header('main'), header('low', { feed: { kind: 'letdown', fromHeaderId: 'main', greatestKgPerH: 400 } })],
  ventGroups: [ventGroup('group', { marginMinutes: 1, steamOnsAtOnce: 1, steamOnMinutes: 2, leastHeaderBarG: 6.5 })],
  sharedLimits: [{ id: 'crates', name: 'Crates', unit: 'crates', capacity: [{ from: 0, value: 4 }] }],
  cleaning: [['A', 'B', 15] as const, ['B', 'A', 30] as const].map(([fromFamilyId, toFamilyId, minutes]) => ({
    unitKind: 'kettle',
    fromFamilyId,
    toFamilyId,
    minutes,
    kind: minutes > 20 ? 'allergen' : 'rinse',
    phases: [phase(0, 10, 444.4, 'wash')],
    uses: [{ limitId: 'crates', offsetMin: 0, minutes, amount: 1 }],
  })),
});

const rate = fc.double({ min: 0, max: 2000, noNaN: true });
const kind = fc.constantFrom<DutyPhase['kind']>('warmUp', 'vent', 'comeUp', 'process', 'run', 'cool');

/** Duty phases of real length. */
export const dutyPhases: fc.Arbitrary<DutyPhase[]> = fc.array(
  fc.record({ kind, minutes: fc.double({ min: 0, max: 90, noNaN: true }), steamKgPerH: rate }),
  { maxLength: 8 },
);

/** Idling and warming up between runs, and a machine still warm after a short gap; often neither. */
const beforeRun: fc.Arbitrary<Pick<Mode, 'between' | 'warm'>> = fc
  .tuple(fc.boolean(), fc.boolean(), rate, fc.integer({ min: 1, max: 30 }), fc.integer({ min: 0, max: 600 }))
  .map(([idles, cools, kgPerH, minutes, idleUpToMin]) => ({
    ...(idles
      ? {
          between: {
            idleKgPerH: kgPerH / 8,
            warmUp: [phase(0, minutes, kgPerH, 'warmUp'), phase(minutes, 2, kgPerH / 2, 'warmUp')],
            idleUpToMin: Math.max(idleUpToMin, minutes + 1),
          },
        }
      : {}),
    ...(cools
      ? {
          warm: [
            { gapUpToMin: 20, phases: [phase(0, 3, kgPerH / 4, 'vent'), phase(3, 2, kgPerH / 5)] },
            { gapUpToMin: 240, phases: [phase(1, 4, kgPerH / 3, 'vent')] },
          ],
        }
      : {}),
  }));

const mode: fc.Arbitrary<Omit<Mode, 'unitId'>> = fc
  .tuple(fc.array(fc.tuple(fc.integer({ min: 1, max: 40 }), rate, kind), { minLength: 1, maxLength: 5 }), beforeRun)
  .map(([parts, before]) => {
    let offset = 0;
    const phases = parts.map(([minutes, kgPerH, phaseKind]) => {
      offset += minutes;
      return phase(offset - minutes, minutes, kgPerH, phaseKind);
    });
    return {
      ...before,
      minutes: offset,
      phases,
      uses: [{ limitId: 'crates', offsetMin: 0, minutes: offset, amount: 2 }],
      dutyId: null,
    };
  });

const unitId = fc.constantFrom(...UNITS);
export const start = fc.integer({ min: 0, max: SHORT_WEEK_MIN - 1 });
export const placement = fc.record({ unitId, start });

/** Activities a0, a1, ... placed or not, on the small plant's units, all of them eligible. */
export const activities: fc.Arbitrary<Activity[]> = fc
  .array(fc.tuple(mode, fc.option(placement, { freq: 5 }), fc.constantFrom('A', 'B', null), fc.boolean()), {
    maxLength: 14,
  })
  .map((drawn) =>
    drawn.map(([shape, placed, familyId, released], i) =>
      activity(`a${i}`, {
        stage: placed?.unitId.startsWith('r') ? 'retort' : 'cook',
        modes: UNITS.map((id) => ({ ...shape, unitId: id })),
        placement: placed,
        familyId,
        processData: { id: 'p', document: 'TP-1', issue: '1', released },
        due: placed ? placed.start + 60 : null,
        earliestStart: -10_000,
      }),
    ),
  );

/** A short week on a small plant with letdown, vent group, shared limit, cleaning and links between neighbours. */
export const weeks: fc.Arbitrary<Week> = activities.map((drawn) =>
  week({
    horizonMin: SHORT_WEEK_MIN,
    plant: smallPlant,
    capacities: [
      capacity('main', 1500, {
        baseLoadKgPerH: [{ from: 0, value: 123.4 }],
        greatestRiseKgPerHPerMin: [{ from: 0, value: 100 }],
        storedKgPerBar: [{ from: 0, value: 20 }],
      }),
      capacity('low', null, { baseLoadKgPerH: [{ from: 0, value: 10 }] }),
    ],
    activities: drawn,
    links: drawn.slice(1).map((later, i) => {
      const greatest = { leastMin: 10, greatestMin: 120, rule: i % 2 === 0 ? 'flow' : 'sinceClosing' } as const;
      return link(`l${i}`, `a${i}`, later.id, greatest);
    }),
  }),
);
