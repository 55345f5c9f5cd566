import * as v from 'valibot';

/** Version of the file format that this program writes and understands. */
export const fileVersion = 1;
export const fileFormat = 'evenload-campaign';

const text = (most: number) => v.pipe(v.string(), v.maxLength(most));
const uuid = v.pipe(v.string(), v.regex(/^[0-9a-f]{8}-[0-9a-f]{4}-7[0-9a-f]{3}-[89ab][0-9a-f]{3}-[0-9a-f]{12}$/));
const hash = v.pipe(v.string(), v.regex(/^[0-9a-f]{64}$/));
const count = v.pipe(v.number(), v.integer(), v.minValue(0), v.maxValue(1e9));

/** First line: what the file is; identity is inside, the file's name means nothing. */
export const HeaderSchema = v.strictObject({
  format: v.literal(fileFormat),
  version: v.literal(fileVersion),
  campaign: uuid,
  title: text(200),
  /** How many event lines follow, so that a cut file can say what is missing. */
  events: count,
  /** The device that wrote the file, when, with which version of the program. */
  device: uuid,
  at: text(40),
  app: text(40)
});

/** The writing device's signature over the footer's SHA-256. */
export const SignatureSchema = v.strictObject({
  algorithm: v.picklist(['ECDSA-P256-SHA256', 'Ed25519']),
  /** Public key, SPKI, base64. */
  key: text(400),
  value: text(400)
});

/** Last line: how many events, and the SHA-256 of every byte before this line. */
export const FooterSchema = v.strictObject({
  events: count,
  sha256: hash,
  signature: v.nullable(SignatureSchema),
  /** SHA-256 of the canonical JSON of the footer without this field, so that a changed footer is noticed too. */
  seal: hash
});

export type FileHeader = v.InferOutput<typeof HeaderSchema>;
export type FileFooter = v.InferOutput<typeof FooterSchema>;
export type FileSignature = v.InferOutput<typeof SignatureSchema>;
