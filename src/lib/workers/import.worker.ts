import { Connection } from '#lib/storage/connection.ts';
import { ImportJob } from './import-job.ts';
import type { ImportReply, ImportRequest } from './import-messages.ts';

const say = (reply: ImportReply): void => self.postMessage(reply);

/** One worker, one file. Whoever wants it stopped ends the worker; a transaction on its way is then undone by the browser. */
const job = new ImportJob(new Connection(), say);

async function answer(request: ImportRequest): Promise<ImportReply> {
  switch (request.tag) {
    case 'read':
      return { tag: 'proposed', result: await job.read(request.file) };
    case 'weigh':
      return { tag: 'proposed', result: await job.weigh() };
    case 'take':
      return { tag: 'taken', result: await job.take(request.order) };
  }
}

self.onmessage = ({ data }: MessageEvent<ImportRequest>) => {
  answer(data).then(say, (thrown: unknown) => say({ tag: 'failed', detail: String(thrown) }));
};
