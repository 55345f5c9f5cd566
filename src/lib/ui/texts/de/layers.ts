import { layersBeside } from './layers-beside.ts';
import { layersOfFit } from './layers-of-fit.ts';
import type { layers as en } from '../en/layers.ts';

/** Every layer under the answer. */
export const layers: typeof en = { ...layersOfFit, ...layersBeside };
