import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { draftFromPlan, draftFromTemplate } from '#lib/core/campaign/draft/draft-from-plan.ts';
import { newMeasurand } from '#lib/core/campaign/draft/new-draft.ts';
import { parseDraft } from '#lib/core/campaign/draft/plan-draft.ts';
import { readDraft } from '#lib/core/campaign/draft/read-draft.ts';
import { scrubDraft } from './scrub-draft.ts';

describe('draftFromPlan(plan)', () => {
  test('means the same plan again', () => {
    const draft = scrubDraft();
    draft.measurands.push({ ...newMeasurand(draft.measurands), label: 'Gloss', direction: 'target', target: '85' });
    draft.machines[0]!.layout = 'grid';
    const { plan } = readDraft(draft);
    const again = draftFromPlan(plan);
    expect(readDraft(again).plan).toEqual(plan);
    expect(parseDraft(again)).toEqual(again);
  });

  test('keeps every number, 1.234 too, which typed by a person has two meanings', () => {
    const value = fc.oneof(
      fc.double({ min: 1e-300, max: 1e300, noNaN: true }),
      fc.integer({ min: 1, max: 10_000_000 }).map((n) => n / 1000)
    );
    fc.assert(
      fc.property(value, (scatter) => {
        const { plan } = readDraft(scrubDraft());
        plan.measurands[0]!.scatter = scatter;
        const { plan: again, faults } = readDraft(draftFromPlan(plan));
        return faults.length === 0 && again.measurands[0]!.scatter === scatter;
      })
    );
  });

  test('keeps the id of a measurand whose label is corrected', () => {
    const { plan } = readDraft(scrubDraft());
    const draft = draftFromPlan(plan);
    draft.measurands[0]!.label = 'Film loss';
    expect(readDraft(draft).plan.measurands[0]).toMatchObject({ id: 'loss_of_film_thickness', label: 'Film loss' });
  });
});

describe('draftFromTemplate(plan)', () => {
  test('takes the frame and neither title nor question', () => {
    const { plan } = readDraft({ ...scrubDraft(), question: 'Which?' });
    const draft = draftFromTemplate(plan);
    expect(draft).toMatchObject({ title: '', question: '' });
    expect(readDraft({ ...draft, title: plan.title, question: plan.question }).plan).toEqual(plan);
  });
});
