/** The planner for a page without the app: leaves its two functions on the global object. */
import { layOutPlan } from '#lib/core/design/lay-out-plan.ts';
import { proposeDesigns } from '#lib/core/design/propose/propose-designs.ts';

Object.assign(globalThis, { proposeDesigns, layOutPlan });
