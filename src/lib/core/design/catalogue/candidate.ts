import type { Blocks } from '../blocks.ts';
import type { Parameters } from './parameters.ts';

/** What a construction hands over; nobody sees it before it is counted. */
export interface Candidate {
  blocks: Blocks;
  /** How the blocks were made, one sentence. */
  construction: string;
  /** The construction's tag, for translation. */
  constructionId: string;
  /** Where the construction is published. */
  source: string;
  /** Blocks by parallel class (each class holds every treatment once), where the construction gives them. */
  resolution?: number[][];
}

/** Tries to make a design of the given parameters; null where the construction does not apply or found nothing. */
export type Construction = (p: Parameters) => Candidate | null;
