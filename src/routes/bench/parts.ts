/** What comes with the campaign, beside the first script: the panels of the steps. */
export { default as Precautions } from '#lib/ui/bench/Precautions.svelte';
export { default as StepPanel } from './StepPanel.svelte';
