import { analyse, type AnalysisStage } from '#lib/core/analysis/analyse.ts';
import type { Analysis } from '#lib/core/analysis/analysis-result.ts';
import type { Observations } from '#lib/core/analysis/observations.ts';
import type { InputFault } from '#lib/core/analysis/reason.ts';
import type { Result } from '#lib/core/result.ts';

export interface AnalysisRequest {
  id: number;
  observations: Observations;
}

export type AnalysisReply =
  | { id: number; tag: 'stage'; stage: AnalysisStage }
  | { id: number; tag: 'done'; result: Result<Analysis, InputFault> }
  | { id: number; tag: 'failed'; detail: string };

const reply = (message: AnalysisReply): void => self.postMessage(message);

self.onmessage = ({ data: { id, observations } }: MessageEvent<AnalysisRequest>) => {
  try {
    const result = analyse(observations, (stage) => reply({ id, tag: 'stage', stage }));
    reply({ id, tag: 'done', result });
  } catch (thrown) {
    reply({ id, tag: 'failed', detail: String(thrown) });
  }
};
