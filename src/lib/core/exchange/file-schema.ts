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

/** 32 bytes as base64url, as a JSON Web Key writes a coordinate (RFC 7518, 6.2.1). */
const coordinate = v.pipe(v.string(), v.regex(/^[\w-]{43}$/));

/** A device's public signing key as a JSON Web Key with nothing but what makes the key. */
export const PublicKeySchema = v.strictObject({
  kty: v.literal('EC'),
  crv: v.literal('P-256'),
  x: coordinate,
  y: coordinate
});

/** Version of the signature that this program makes and can check. */
export const signatureVersion = 1;

/**
 * The writing device's signature. Version 1: ECDSA on P-256 with SHA-256 (FIPS 186-5) over the UTF-8 bytes of
 * `signedStatement`; `value` is r and s, 32 bytes each, as base64url. A later version is carried, not understood.
 */
export const SignatureSchema = v.union([
  v.strictObject({
    version: v.literal(signatureVersion),
    key: PublicKeySchema,
    value: v.pipe(v.string(), v.regex(/^[\w-]{86}$/))
  }),
  v.looseObject({ version: v.pipe(v.number(), v.integer(), v.minValue(signatureVersion + 1)) })
]);

/** Last line: how many events, and the SHA-256 of every byte before this line. */
export const FooterSchema = v.strictObject({
  events: count,
  sha256: hash,
  /** null: the device could not sign. */
  signature: v.nullable(SignatureSchema),
  /** SHA-256 of the canonical JSON of the footer without this field, so that a changed footer is noticed too. */
  seal: hash
});

export type FileHeader = v.InferOutput<typeof HeaderSchema>;
export type FileFooter = v.InferOutput<typeof FooterSchema>;
export type PublicKey = v.InferOutput<typeof PublicKeySchema>;
/** A signature of the version that is understood here. */
export type FileSignature = v.InferOutput<(typeof SignatureSchema)['options'][0]>;
