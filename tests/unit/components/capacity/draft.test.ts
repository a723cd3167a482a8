import { describe, expect, it } from 'vitest';
import { dragDraft, firstDraft, nudgeDraft, type Draft, type Grip } from '@/components/capacity/draft';

const bounds = { horizonMin: 10_080, snapMin: 15, topKgPerH: 8_000, snapKgPerH: 50 };
const draft: Draft = { subject: { kind: 'limit', headerId: 'main' }, fromMin: 600, toMin: 720, value: 4_300 };
const firing: Draft = { subject: { kind: 'firing', boilerId: 'b2' }, fromMin: 600, toMin: 720, value: 0 };

describe('dragDraft', () => {
  it('pulls a span open to the right and sets the level under the hand', () => {
    const pulled = dragDraft({ ...draft, toMin: 600 }, 'draw', { minutes: 128, kgPerH: -690 }, bounds);
    // 600 + 128 = 728, to the nearest 15: 735; 4300 - 690 = 3610, to the nearest 50: 3600.
    expect(pulled).toEqual({ ...draft, fromMin: 600, toMin: 735, value: 3_600 });
  });

  it('pulls a span open to the left', () => {
    const pulled = dragDraft({ ...draft, toMin: 600 }, 'draw', { minutes: -61, kgPerH: 0 }, bounds);
    expect([pulled.fromMin, pulled.toMin, pulled.value]).toEqual([540, 600, 4_300]);
  });

  it('keeps one snap of span where the hand has not moved', () => {
    const pulled = dragDraft({ ...draft, toMin: 600 }, 'draw', { minutes: 0, kgPerH: 0 }, bounds);
    expect([pulled.fromMin, pulled.toMin]).toEqual([600, 615]);
  });

  it('never lets an end pass the other', () => {
    expect(dragDraft(draft, 'from', { minutes: 900, kgPerH: 0 }, bounds).fromMin).toBe(715);
    expect(dragDraft(draft, 'to', { minutes: -900, kgPerH: 0 }, bounds).toMin).toBe(605);
  });

  it('moves the span whole and keeps it within the week', () => {
    const moved = dragDraft(draft, 'span', { minutes: 20_000, kgPerH: 0 }, bounds);
    expect([moved.fromMin, moved.toMin]).toEqual([9_960, 10_080]);
  });

  it('keeps the level between nothing and the top', () => {
    expect(dragDraft(draft, 'level', { minutes: 0, kgPerH: 9_000 }, bounds).value).toBe(8_000);
    expect(dragDraft(draft, 'level', { minutes: 0, kgPerH: -9_000 }, bounds).value).toBe(0);
  });

  it('leaves a boiler lit or shut however high the hand goes', () => {
    expect(dragDraft(firing, 'draw', { minutes: 60, kgPerH: 3_000 }, bounds).value).toBe(0);
  });

  it.each<Grip>(['draw', 'from', 'to', 'level', 'span'])('does not change what it was given: %s', (grip) => {
    const before = structuredClone(draft);
    dragDraft(draft, grip, { minutes: 77, kgPerH: 77 }, bounds);
    expect(draft).toEqual(before);
  });
});

describe('nudgeDraft', () => {
  it('moves ends by the snap, or by an hour with a large step', () => {
    expect(nudgeDraft(draft, 'to', 'ArrowRight', false, bounds)?.toMin).toBe(735);
    expect(nudgeDraft(draft, 'to', 'ArrowRight', true, bounds)?.toMin).toBe(780);
  });

  it('moves the level by 50 or 500 kg/h', () => {
    expect(nudgeDraft(draft, 'level', 'ArrowDown', false, bounds)?.value).toBe(4_250);
    expect(nudgeDraft(draft, 'level', 'ArrowUp', true, bounds)?.value).toBe(4_800);
  });

  it('says null for keys that mean nothing there', () => {
    expect(nudgeDraft(draft, 'level', 'ArrowLeft', false, bounds)).toBeNull();
    expect(nudgeDraft(draft, 'from', 'ArrowUp', false, bounds)).toBeNull();
    expect(nudgeDraft(draft, 'from', 'Tab', false, bounds)).toBeNull();
  });
});

describe('firstDraft', () => {
  it('starts at the next full hour and stays within the week', () => {
    expect(firstDraft(draft.subject, 605, 10_080, 4_000)).toMatchObject({ fromMin: 660, toMin: 780, value: 4_000 });
    expect(firstDraft(draft.subject, 10_075, 10_080, null)).toMatchObject({ fromMin: 9_960, toMin: 10_080 });
    expect(firstDraft(draft.subject, -500, 10_080, null).fromMin).toBe(0);
  });
});
