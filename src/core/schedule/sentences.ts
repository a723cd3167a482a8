import { drawnMode } from '../plant/activity';
import { sayingIn, type Saying } from '../quantity/saying';
import type { Breach, ProcessBreach, SharedBreach, SteamBreach, TimeBreach } from './breach';
import { drawnActivities } from './judged';
import type { Week } from './week';

/** A breach in the words of the floor. */
export interface BreachSentence {
  readonly title: string;
  readonly detail: string;
}

/** Names and figures as people say them; an unknown id is its own name. */
export interface Names {
  readonly say: Saying;
  /** Code and title of an activity. */
  activity(activityId: string): string;
  /** The unit that an activity is placed on. */
  unitOf(activityId: string): string;
  unit(unitId: string): string;
  header(headerId: string): string;
  ventGroup(ventGroupId: string): string;
  limit(limitId: string): { readonly name: string; readonly unit: string };
}

/** A minute of the week as people write it: "06:40", with the day where it is needed. */
export type Clock = (minute: number) => string;

/** The names that a week's breaches need; figures in SI units unless said otherwise. */
export function namesOf(week: Week, say: Saying = sayingIn('si')): Names {
  const drawn = new Map(drawnActivities(week).map((activity) => [activity.id, activity]));
  const named = (items: readonly { readonly id: string; readonly name: string }[]) => {
    const names = new Map(items.map((item) => [item.id, item.name]));
    return (id: string) => names.get(id) ?? id;
  };
  const unit = named(week.plant.units);
  const limits = new Map(week.plant.sharedLimits.map((limit) => [limit.id, limit]));
  return {
    say,
    unit,
    header: named(week.plant.headers),
    ventGroup: named(week.plant.ventGroups),
    limit: (id) => limits.get(id) ?? { name: id, unit: '' },
    activity: (id) => {
      const activity = drawn.get(id);
      if (!activity) return id;
      return activity.title.includes(activity.code) ? activity.title : `${activity.code} ${activity.title}`;
    },
    unitOf: (id) => {
      const activity = drawn.get(id);
      return unit(activity?.placement?.unitId ?? (activity && drawnMode(activity)?.unitId) ?? id);
    },
  };
}

/** What a breach is, in a line, and what it concerns. */
export function breachSentence(breach: Breach, names: Names, clock: Clock): BreachSentence {
  switch (breach.class) {
    case 'steam':
      return steamSentence(breach, names, clock);
    case 'process':
      return processSentence(breach, names, clock);
    case 'shared':
      return sharedSentence(breach, names, clock);
    case 'time':
      return timeSentence(breach, names, clock);
  }
}

/** "A", "A and B", "A, B and C". */
export function listed(words: readonly string[]): string {
  if (words.length < 2) return words[0] ?? '';
  return `${words.slice(0, -1).join(', ')} and ${words.at(-1)}`;
}

/** "1 minute", "5 minutes"; "1 h 20 min" from an hour on. */
export function minutesText(minutes: number): string {
  if (minutes < 60) return minutes === 1 ? '1 minute' : `${minutes} minutes`;
  const rest = minutes % 60;
  return rest === 0 ? `${Math.floor(minutes / 60)} h` : `${Math.floor(minutes / 60)} h ${rest} min`;
}

function steamSentence(breach: SteamBreach, names: Names, clock: Clock): BreachSentence {
  const span = `${clock(breach.from)} to ${clock(breach.to)}`;
  const units = [...new Set(breach.activityIds.map((id) => names.unitOf(id)))].slice(0, 3);
  const who =
    units.length === 0 ? 'Only the base load draws' : `${listed(units)} ${units.length === 1 ? 'draws' : 'draw'} most`;
  const header = names.header(breach.headerId);
  const sag =
    breach.sagBar === null ? '' : `; the pressure would fall by about ${names.say.pressureFall(breach.sagBar)}`;
  const kg = names.say.mass(breach.kg);
  switch (breach.code) {
    case 'overLimit':
      return {
        title: `Over the steam limit by ${names.say.rate(breach.overKgPerH)}, ${span}`,
        detail: `${who}. ${header}: ${kg} missing${sag}.`,
      };
    case 'letdownOver':
      return {
        title: `More than the letdown can pass by ${names.say.rate(breach.overKgPerH)}, ${span}`,
        detail: `${who}. ${header}: ${kg} missing.`,
      };
    case 'stepTooSteep':
      return {
        title: `Step too steep: ${names.say.rate(breach.overKgPerH)} more at ${clock(breach.from)}`,
        detail: `${units.length === 0 ? 'The base load' : listed(units)} ${units.length === 1 || units.length === 0 ? 'rises' : 'rise'} faster than the boilers in fire can follow. ${header}: ${kg} missing until ${clock(breach.to)}${sag}.`,
      };
  }
}

function processSentence(breach: ProcessBreach, names: Names, clock: Clock): BreachSentence {
  const first = names.activity(breach.activityIds[0] ?? '');
  const group = names.ventGroup(breach.ventGroupId ?? '');
  const span = `${clock(breach.from)} to ${clock(breach.to)}`;
  const units = listed([...new Set(breach.activityIds.map((id) => names.unitOf(id)))]);
  const waited = minutesText(breach.found ?? 0);
  const allowed = minutesText(breach.limit ?? 0);
  switch (breach.code) {
    case 'ventsAtOnce':
      return { title: `${breach.found} vents at once, ${span}`, detail: `${units}: ${group} allows ${breach.limit}.` };
    case 'steamOnsAtOnce':
      return {
        title: `${breach.found} steam ons at once, ${span}`,
        detail: `${units}: ${group} allows ${breach.limit}.`,
      };
    case 'waitSinceClosing':
      return {
        title: `Wait since closing too long: ${first}`,
        detail: `${waited} since the first container was closed; at most ${allowed}, until ${clock(breach.from)}.`,
      };
    case 'initialTemperature':
      return {
        title: `Too long for the initial temperature: ${first}`,
        detail: `${waited} since the first container was closed; at most ${allowed}, until ${clock(breach.from)}.`,
      };
    case 'waitTooLong':
      return {
        title: `Wait too long: ${first}`,
        detail: `${waited} after ${names.activity(breach.activityIds[1] ?? '')}; at most ${allowed}, until ${clock(breach.from)}.`,
      };
    case 'unreleasedData':
      return {
        title: `Process data not released: ${first}`,
        detail: `${names.unitOf(breach.activityIds[0] ?? '')} at ${clock(breach.from)}. The quality lead has to release the data first.`,
      };
    case 'allergenCleaning':
      return {
        title: `Allergen clean too short before ${first}`,
        detail: `${waited} are left after ${names.activity(breach.activityIds[1] ?? '')}; the clean takes ${allowed}.`,
      };
    default:
      return practiceSentence({ ...breach, code: breach.code }, names, clock);
  }
}

type PracticeCode = 'allergenRelease' | 'runningTooLong' | 'standingDirty' | 'ventPressure';

function practiceSentence(
  breach: ProcessBreach & { readonly code: PracticeCode },
  names: Names,
  clock: Clock,
): BreachSentence {
  const first = names.activity(breach.activityIds[0] ?? '');
  const unit = names.unitOf(breach.activityIds[0] ?? '');
  const found = minutesText(breach.found ?? 0);
  const allowed = minutesText(breach.limit ?? 0);
  switch (breach.code) {
    case 'allergenRelease':
      return {
        title: `${unit} not yet released after the allergen clean: ${first}`,
        detail: `${found} after the clean; the release takes ${allowed}, until ${clock(breach.to)}.`,
      };
    case 'runningTooLong':
      return {
        title: `${unit} runs too long without a full clean`,
        detail: `${found} between two full cleans; at most ${allowed}, until ${clock(breach.from)}. A rinse is no full clean.`,
      };
    case 'standingDirty':
      return {
        title: `${unit} stands dirty too long after ${first}`,
        detail: `${found} until ${clock(breach.to)}; at most ${allowed}, until ${clock(breach.from)}.`,
      };
    case 'ventPressure': {
      const group = names.ventGroup(breach.ventGroupId ?? '');
      return {
        title: `Header too low to vent: ${names.say.pressure(breach.found ?? 0)}, ${clock(breach.from)} to ${clock(breach.to)}`,
        detail: `${unit}: ${group} was validated at ${names.say.pressure(breach.limit ?? 0)} or more.`,
      };
    }
  }
}

function sharedSentence(breach: SharedBreach, names: Names, clock: Clock): BreachSentence {
  const { name, unit } = names.limit(breach.limitId);
  const units = [...new Set(breach.activityIds.map((id) => names.unitOf(id)))];
  const withUnit = (amount: number) => `${Math.round(amount * 10) / 10}${unit === '' ? '' : ` ${unit}`}`;
  return {
    title: `${name}: ${withUnit(breach.found)} needed, ${withUnit(breach.limit)} there, ${clock(breach.from)} to ${clock(breach.to)}`,
    detail: `${listed(units)} ${units.length === 1 ? 'needs' : 'need'} them.`,
  };
}

function timeSentence(breach: TimeBreach, names: Names, clock: Clock): BreachSentence {
  const first = names.activity(breach.activityIds[0] ?? '');
  const second = names.activity(breach.activityIds[1] ?? '');
  const unit = names.unit(breach.unitId ?? '');
  const found = minutesText(breach.found ?? 0);
  const limit = minutesText(breach.limit ?? 0);
  switch (breach.code) {
    case 'unitClash':
      return {
        title: `${unit} is taken twice at ${clock(breach.from)}`,
        detail: `${second} still has it when ${first} comes, for ${found}.`,
      };
    case 'unitNotEligible':
      return { title: `${first} can't run on ${unit}`, detail: `Move it to a unit that it can run on.` };
    case 'outsideShift':
      return {
        title: `${first} runs outside the shift`,
        detail: `${unit} is not crewed ${clock(breach.from)} to ${clock(breach.to)}.`,
      };
    case 'waitTooShort':
      return { title: `Wait too short: ${first}`, detail: `${found} after ${second}; at least ${limit}.` };
    case 'waitTooLong':
      return { title: `Wait too long: ${first}`, detail: `${found} after ${second}; at most ${limit}.` };
    case 'cleaningTooShort':
      return {
        title: `Cleaning too short before ${first}`,
        detail: `${found} are left on ${unit} after ${second}; the cleaning takes ${limit}.`,
      };
    case 'late':
      return { title: `${first} is late by ${found}`, detail: `Due ${clock(breach.from)}, ready ${clock(breach.to)}.` };
    case 'beforeEarliest':
      return {
        title: `${first} is early by ${found}`,
        detail: `Planned ${clock(breach.from)}; it can't be there before ${clock(breach.to)}.`,
      };
    case 'afterLatest':
      return {
        title: `${first} is planned ${found} after its latest time`,
        detail: `Latest ${clock(breach.from)}, planned ${clock(breach.to)}.`,
      };
  }
}
