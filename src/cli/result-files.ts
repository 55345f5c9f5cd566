import { basename } from 'node:path';
import { sha256 } from '@noble/hashes/sha2.js';
import { bytesToHex } from '@noble/hashes/utils.js';
import type { CampaignState } from '../lib/core/campaign/state.ts';
import { rfc3339 } from '../lib/core/campaign/rfc3339.ts';
import { makePackage } from '../lib/core/exchange/package/make-package.ts';
import { reportHtml } from '../lib/core/exchange/report/report-html.ts';
import type { MeasurandResult } from '../lib/state/all-results.ts';
import { numberWriter } from '../lib/ui/format/number-writer.ts';
import { reportContent } from '../lib/ui/report/report-content.ts';
import { measuredOf } from '../lib/ui/results/view.ts';

export const languages = ['en', 'de'] as const;
export type Language = (typeof languages)[number];

interface Made {
  state: CampaignState;
  results: MeasurandResult[];
  /** The campaign file: its path and its bytes. */
  file: string;
  bytes: Uint8Array;
  app: string;
  /** Milliseconds since 1970. */
  now: number;
}

const timeOf = (now: number): string => rfc3339(now, -new Date(now).getTimezoneOffset());

/** The report as the screen saves it, in the words of a language. */
export async function reportFile({ state, results, file, bytes, app, now }: Made, language: Language): Promise<string> {
  const words = await (language === 'en'
    ? import('../lib/ui/texts/en/all-results.ts')
    : import('../lib/ui/texts/de/all-results.ts'));
  const { report } = await (language === 'en'
    ? import('../lib/ui/texts/en/report.ts')
    : import('../lib/ui/texts/de/report.ts'));
  const content = reportContent({
    language,
    campaign: state,
    views: results.map(({ measurand, input, analysis }) => ({ measured: measuredOf(measurand), input, analysis })),
    words,
    report,
    write: numberWriter(language === 'en' ? 'en-GB' : 'de-DE'),
    app,
    made: timeOf(now),
    campaignFile: { name: basename(file), sha256: bytesToHex(sha256(bytes)), events: state.events }
  });
  return reportHtml(content);
}

/** The data package as the screen saves it. */
export function packageFile({ state, results, file, bytes, app, now }: Made): Uint8Array {
  return makePackage({
    state,
    campaignFile: { name: basename(file), bytes, sha256: bytesToHex(sha256(bytes)) },
    results,
    created: timeOf(now),
    app
  });
}
