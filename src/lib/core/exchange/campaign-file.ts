import type { CampaignEvent, UnknownEvent } from '../campaign/event.ts';
import { canonicalJson, sha256OfText } from '../campaign/seal.ts';
import { fileFormat, type FileFooter, type FileHeader, type FileSignature, fileVersion } from './file-schema.ts';

type Any = CampaignEvent | UnknownEvent;

export interface FileMaker {
  campaign: string;
  title: string;
  device: string;
  /** RFC 3339 time of writing. */
  at: string;
  app: string;
}

/** The lines of a file up to its footer, and what the footer will say of them. */
export interface FileBody {
  text: string;
  events: number;
  sha256: string;
}

/** Header and events, each a line of canonical JSON, in the order given; the order carries no meaning. */
export function fileBody(events: readonly Any[], maker: FileMaker): FileBody {
  const { campaign, title, device, at, app } = maker;
  const header: FileHeader = {
    format: fileFormat,
    version: fileVersion,
    campaign,
    title,
    events: events.length,
    device,
    at,
    app
  };
  const text = [header, ...events].map((line) => `${canonicalJson(line)}\n`).join('');
  return { text, events: events.length, sha256: sha256OfText(text) };
}

/** The whole file: body and footer. */
export function closeFile(body: FileBody, signature: FileSignature | null): string {
  const footer = { events: body.events, sha256: body.sha256, signature };
  const sealed: FileFooter = { ...footer, seal: sha256OfText(canonicalJson(footer)) };
  return `${body.text}${canonicalJson(sealed)}\n`;
}

/**
 * A campaign file without a signature: JSON Lines of header, events, footer with count and SHA-256.
 * Checked by: test/core/exchange/campaign-file.test.ts.
 */
export const writeCampaignFile = (events: readonly Any[], maker: FileMaker): string =>
  closeFile(fileBody(events, maker), null);
