import { expect, test } from '@playwright/test';
import { build } from 'vite';
import { layOutPlan } from '#lib/core/design/lay-out-plan.ts';
import { proposeDesigns } from '#lib/core/design/propose/propose-designs.ts';
import type { DesignRequest } from '#lib/core/design/propose-types.ts';

const asked: DesignRequest = {
  treatments: 14,
  machines: [{ slots: 4 }],
  maxSessions: 21,
  sessionSizes: null,
  specimens: null,
  sessionsPerShift: 3,
  resolvable: false,
  control: null,
  forbiddenPairs: [],
  scatter: 1,
  difference: 2.5,
  alpha: 0.05,
  minutesPerSession: 40,
  seed: 'same everywhere',
  effort: 'quick'
};

/** planner-entry.ts and all it needs as one script. */
async function script(): Promise<string> {
  const result = await build({
    configFile: false,
    logLevel: 'silent',
    publicDir: false,
    build: {
      write: false,
      minify: false,
      lib: { entry: `${process.cwd()}/test/e2e/planner-entry.ts`, formats: ['iife'], name: 'planner' }
    }
  });
  const output = Array.isArray(result) ? result[0]! : result;
  if (!('output' in output)) throw new Error('no bundle');
  return output.output[0].code;
}

test('the same seed gives the same designs and the same loading order in Node and in Chromium', async ({ page }) => {
  const here = await proposeDesigns(asked);
  if (!here.ok) throw new Error(JSON.stringify(here.error));
  const blocks = here.value.choices.at(-1)!.blocks;
  const layout = {
    treatments: Array.from({ length: 14 }, (_, i) => `t${i}`),
    blocks,
    machines: [{ id: 'm', inService: [true, true, true, true] }],
    sessionsPerShift: 3,
    order: 'early-stop' as const,
    seed: 'same everywhere'
  };
  await page.goto('about:blank');
  await page.addScriptTag({ content: await script() });
  const there = await page.evaluate(
    async ([request, lay]) => {
      const planner = globalThis as unknown as { proposeDesigns: typeof proposeDesigns; layOutPlan: typeof layOutPlan };
      return { answer: await planner.proposeDesigns(request), order: planner.layOutPlan(lay) };
    },
    [asked, layout] as const
  );
  if (!there.answer.ok) throw new Error(JSON.stringify(there.answer.error));
  expect(there.answer.value.choices.map((choice) => choice.blocks)).toEqual(
    here.value.choices.map((choice) => choice.blocks)
  );
  expect(there.answer.value.recommended).toEqual(here.value.recommended);
  expect(there.order).toEqual(JSON.parse(JSON.stringify(layOutPlan(layout))));
});
