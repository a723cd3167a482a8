import { describe, expect, it } from 'vitest';
import { reasonSentence, type ReasonWords } from '@/core/levelling/reasons';
import type { MoveReason } from '@/core/levelling/proposal';

const words: ReasonWords = { activity: (id) => `load ${id}`, time: (minute) => `minute ${minute}` };

describe('reasonSentence', () => {
  it.each<[MoveReason, string]>([
    [{ kind: 'vents', activityId: 'A1', minute: 400 }, 'keeps its vent apart from that of load A1 at minute 400'],
    [{ kind: 'steam', activityId: 'A1', minute: 400 }, 'leaves the steam to load A1 at minute 400'],
    [{ kind: 'boiler', activityId: null, minute: 720 }, 'keeps clear of the lower steam limit at minute 720'],
    [{ kind: 'cleaning', activityId: 'A2', minute: 10 }, 'leaves the time to clean between it and load A2'],
    [{ kind: 'wait', activityId: 'A2', minute: null }, 'keeps its wait to load A2'],
    [{ kind: 'unit', activityId: null, minute: 10 }, 'runs on another unit'],
    [{ kind: 'other', activityId: null, minute: null }, 'makes room for others'],
  ])('says %j', (reason, sentence) => {
    expect(reasonSentence(reason, words)).toBe(sentence);
  });
});
