import { layersBeside } from './layers-beside.ts';
import { layersOfFit } from './layers-of-fit.ts';

/** Every layer under the answer. */
export const layers = { ...layersOfFit, ...layersBeside };
