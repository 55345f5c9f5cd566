import {
  newCondition,
  newConstant,
  newMachine,
  newMeasurand,
  newReading,
  newTreatment
} from '#lib/core/campaign/draft/new-draft.ts';
import { pasteTreatments } from '#lib/core/campaign/draft/paste-treatments.ts';
import type { PlanDraft } from '#lib/core/campaign/draft/plan-draft.ts';

/** What the form can do to a draft beside typing into its fields. Works on the draft in place. */
export function planVerbs(draft: () => PlanDraft) {
  return {
    addTreatment: () => void draft().treatments.push(newTreatment(draft().treatments)),
    removeTreatment: (at: number) => {
      const [gone] = draft().treatments.splice(at, 1);
      const { design } = draft();
      design.apart = design.apart.filter(({ one, other }) => one !== gone?.key && other !== gone?.key);
      if (draft().treatments.length === 0) draft().treatments.push(newTreatment([]));
    },
    pasteTreatments: (text: string, at: number): number => {
      const { treatments } = draft();
      const made = pasteTreatments(text, treatments);
      // Rows that are empty from the pasted one on are filled; what is written stays.
      const rest = treatments.slice(at).filter(({ name }) => name.trim() !== '');
      draft().treatments = [...treatments.slice(0, at), ...made, ...rest];
      return made.length;
    },
    addApart: () => {
      const [one, other] = draft().treatments;
      draft().design.apart.push({ one: one?.key ?? '', other: other?.key ?? '' });
    },
    removeApart: (at: number) => void draft().design.apart.splice(at, 1),
    addMachine: () => void draft().machines.push(newMachine(draft().machines)),
    removeMachine: (at: number) => void draft().machines.splice(at, 1),
    setSlots: (machine: number, slots: number) => {
      const list = draft().machines[machine]?.slots;
      if (!list || !Number.isInteger(slots) || slots < 1 || slots > 100) return;
      while (list.length < slots) list.push({ name: String(list.length + 1), inService: true });
      list.length = slots;
    },
    addReading: () => void draft().readings.push(newReading(draft().readings)),
    removeReading: (at: number) => void draft().readings.splice(at, 1),
    addConstant: () => void draft().constants.push(newConstant(draft().constants)),
    removeConstant: (at: number) => void draft().constants.splice(at, 1),
    addMeasurand: () => void draft().measurands.push(newMeasurand(draft().measurands)),
    removeMeasurand: (at: number) => void draft().measurands.splice(at, 1),
    addCondition: () => void draft().conditions.push(newCondition(draft().conditions)),
    removeCondition: (at: number) => void draft().conditions.splice(at, 1)
  };
}
