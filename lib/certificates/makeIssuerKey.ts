import { createHash, webcrypto } from "node:crypto";
import {
  BitString,
  fromBER,
  Integer,
  ObjectIdentifier,
  OctetString,
  PrintableString,
  Sequence,
  Set,
  Utf8String,
} from "asn1js";
import {
  AuthorityKeyIdentifier,
  BasicConstraints,
  Certificate,
  CryptoEngine,
  Extension,
  RelativeDistinguishedNames,
  Time,
  TimeType,
} from "pkijs";

export type IssuerKeyFiles = { rootKeyPem: string; rootPem: string; keyPem: string; certificatePem: string };
export type IssuerKeyWish = { organisation: string; country?: string; demonstration: boolean; from: Date };

/** Years: a certificate must be checkable for its life and the retention after it (common practice, no source). */
const ROOT_YEARS = 25;
const ISSUER_YEARS = 12;
const P256 = { name: "ECDSA", namedCurve: "P-256" } as const;
const ENGINE = new CryptoEngine({ name: "node", crypto: webcrypto as Crypto });

/**
 * A root of our own and an issuer certificate under it, both P-256, as PEM. The root signs nothing else, so its key belongs off
 * the machine once the files are written.
 */
export async function makeIssuerKey(wish: IssuerKeyWish): Promise<IssuerKeyFiles> {
  const root = await webcrypto.subtle.generateKey(P256, true, ["sign", "verify"]);
  const issuer = await webcrypto.subtle.generateKey(P256, true, ["sign", "verify"]);
  const rootCertificate = await certify({
    wish,
    title: "root",
    years: ROOT_YEARS,
    subjectKey: root.publicKey,
    signer: root,
  });
  const issuerCertificate = await certify({
    wish,
    title: "issuer of certificates",
    years: ISSUER_YEARS,
    subjectKey: issuer.publicKey,
    signer: root,
    above: rootCertificate,
  });
  return {
    rootKeyPem: await keyPem(root.privateKey),
    rootPem: pem("CERTIFICATE", rootCertificate.toSchema(true).toBER(false)),
    keyPem: await keyPem(issuer.privateKey),
    certificatePem: pem("CERTIFICATE", issuerCertificate.toSchema(true).toBER(false)),
  };
}

type Order = {
  wish: IssuerKeyWish;
  title: string;
  years: number;
  subjectKey: webcrypto.CryptoKey;
  signer: webcrypto.CryptoKeyPair;
  /** The certificate above; none for the root, which signs itself. */
  above?: Certificate;
};

async function certify({ wish, title, years, subjectKey, signer, above }: Order): Promise<Certificate> {
  const certificate = new Certificate({ version: 2, serialNumber: serialNumber() });
  certificate.subject = distinguishedName(wish, title);
  certificate.issuer = (above ?? certificate).subject;
  certificate.notBefore = time(wish.from, 0);
  certificate.notAfter = time(wish.from, years);
  await certificate.subjectPublicKeyInfo.importKey(subjectKey as CryptoKey, ENGINE);
  certificate.extensions = [...usage(above === undefined), ...(await keyIdentifiers(subjectKey, signer.publicKey))];
  await certificate.sign(signer.privateKey as CryptoKey, "SHA-256", ENGINE);
  return certificate;
}

/** Each attribute in a set of its own; the library alone would put all of them into one. */
function distinguishedName(
  { organisation, country, demonstration }: IssuerKeyWish,
  title: string,
): RelativeDistinguishedNames {
  const mark = demonstration ? " (Demonstration)" : "";
  const attributes = [
    ...(country ? [{ type: "2.5.4.6", value: new PrintableString({ value: country }) }] : []),
    { type: "2.5.4.10", value: new Utf8String({ value: `${organisation}${mark}` }) },
    { type: "2.5.4.3", value: new Utf8String({ value: `${organisation} ${title}${mark}` }) },
  ];
  const sets = attributes.map(
    ({ type, value }) => new Set({ value: [new Sequence({ value: [new ObjectIdentifier({ value: type }), value] })] }),
  );
  const { result } = fromBER(new Sequence({ value: sets }).toBER(false));
  return new RelativeDistinguishedNames({ schema: result });
}

/** RFC 5280, 4.1.2.5: two figures for the year until 2049, four from 2050; whole seconds, which readers insist on. */
function time(from: Date, years: number): Time {
  const value = new Date(1000 * Math.floor(from.getTime() / 1000));
  value.setUTCFullYear(from.getUTCFullYear() + years);
  return new Time({ type: value.getUTCFullYear() < 2050 ? TimeType.UTCTime : TimeType.GeneralizedTime, value });
}

/**
 * RFC 5280, 4.2.1.3 and 4.2.1.9. The issuer certificate has no extended key usage: with document signing alone, common
 * libraries refuse it for a PDF.
 */
const usage = (authority: boolean) => [
  extension(
    "2.5.29.19",
    true,
    new BasicConstraints(authority ? { cA: true, pathLenConstraint: 0 } : { cA: false }).toSchema().toBER(false),
  ),
  // keyCertSign and cRLSign, or digitalSignature and contentCommitment.
  extension("2.5.29.15", true, authority ? keyUsage(0x06, 1) : keyUsage(0xc0, 6)),
];

const keyUsage = (bits: number, unusedBits: number) =>
  new BitString({ valueHex: Uint8Array.of(bits).buffer, unusedBits }).toBER(false);

async function keyIdentifiers(subjectKey: webcrypto.CryptoKey, signerKey: webcrypto.CryptoKey): Promise<Extension[]> {
  const own = new OctetString({ valueHex: await keyIdentifier(subjectKey) });
  const above = new AuthorityKeyIdentifier({
    keyIdentifier: new OctetString({ valueHex: await keyIdentifier(signerKey) }),
  });
  return [
    extension("2.5.29.14", false, own.toBER(false)),
    extension("2.5.29.35", false, above.toSchema().toBER(false)),
  ];
}

const extension = (extnID: string, critical: boolean, extnValue: ArrayBuffer) =>
  new Extension({ extnID, critical, extnValue });

/** RFC 7093, section 2, method 1: the left 160 bits of SHA-256 over the public key's bits. */
async function keyIdentifier(key: webcrypto.CryptoKey): Promise<ArrayBuffer> {
  const point = new Uint8Array(await webcrypto.subtle.exportKey("raw", key));
  return new Uint8Array(createHash("sha256").update(point).digest().subarray(0, 20)).buffer;
}

/** RFC 5280, 4.1.2.2: positive and at most 20 bytes; 16 random ones. */
function serialNumber(): Integer {
  const bytes = webcrypto.getRandomValues(new Uint8Array(16));
  bytes[0] = (bytes[0] & 0x7f) | 0x40;
  return new Integer({ valueHex: bytes.buffer });
}

const keyPem = async (key: webcrypto.CryptoKey) => pem("PRIVATE KEY", await webcrypto.subtle.exportKey("pkcs8", key));

const pem = (label: string, der: ArrayBuffer) =>
  `-----BEGIN ${label}-----\n${(
    Buffer.from(der)
      .toString("base64")
      .match(/.{1,64}/g) ?? []
  ).join("\n")}\n-----END ${label}-----\n`;
