import { proposeDesigns } from '#lib/core/design/propose/propose-designs.ts';
import type { DesignRequest, Progress, ProposeError, Proposal } from '#lib/core/design/propose-types.ts';
import type { Result } from '#lib/core/result.ts';

/** What the worker says: how far it is, each time, and at last its answer or what broke. */
export type ProposeReply =
  | { tag: 'progress'; progress: Progress }
  | { tag: 'answer'; answer: Result<Proposal, ProposeError> }
  | { tag: 'broken'; detail: string };

const say = (reply: ProposeReply): void => self.postMessage(reply);

/** One request, one worker: whoever wants it stopped ends the worker and keeps the last progress. */
self.onmessage = ({ data }: MessageEvent<DesignRequest>) => {
  proposeDesigns(data, { onProgress: (progress) => say({ tag: 'progress', progress }) }).then(
    (answer) => say({ tag: 'answer', answer }),
    (thrown: unknown) => say({ tag: 'broken', detail: String(thrown) })
  );
};
