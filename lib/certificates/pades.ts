import { createHash, createPrivateKey, webcrypto, X509Certificate } from "node:crypto";
import { ObjectIdentifier, OctetString, Sequence } from "asn1js";
import {
  Attribute,
  Certificate,
  ContentInfo,
  CryptoEngine,
  EncapsulatedContentInfo,
  IssuerAndSerialNumber,
  SignedAndUnsignedAttributes,
  SignedData,
  SignerInfo,
} from "pkijs";

/** Object identifiers of the CMS: RFC 5652, sections 4, 5 and 11; RFC 5035, section 3. */
export const OID = {
  data: "1.2.840.113549.1.7.1",
  signedData: "1.2.840.113549.1.7.2",
  contentType: "1.2.840.113549.1.9.3",
  messageDigest: "1.2.840.113549.1.9.4",
  signingCertificateV2: "1.2.840.113549.1.9.16.2.47",
} as const;

/** The issuer's key and certificate, and the certificates above it, the root last. */
export type IssuerKey = { keyPem: string; certificatePem: string; chainPem: string[] };

/**
 * A detached CMS signature of the baseline level of PAdES (ETSI EN 319 142-1, from memory): content type, message digest and
 * signing certificate are signed, and nothing else; the time claimed stands in the PDF's /M. ES256: ECDSA on P-256 with SHA-256.
 */
export async function padesSignature(content: Uint8Array, key: IssuerKey): Promise<Uint8Array> {
  const certificates = [key.certificatePem, ...key.chainPem].map((pem) => new X509Certificate(pem).raw);
  const signer = Certificate.fromBER(certificates[0]);
  const signed = new SignedData({
    version: 1,
    encapContentInfo: new EncapsulatedContentInfo({ eContentType: OID.data }),
    certificates: certificates.map((certificate) => Certificate.fromBER(certificate)),
    signerInfos: [
      new SignerInfo({
        version: 1,
        sid: new IssuerAndSerialNumber({ issuer: signer.issuer, serialNumber: signer.serialNumber }),
        signedAttrs: new SignedAndUnsignedAttributes({
          type: 0,
          attributes: signedAttributes(content, certificates[0]),
        }),
      }),
    ],
  });
  const engine = new CryptoEngine({ name: "node", crypto: webcrypto as Crypto });
  await signed.sign(await signingKey(key.keyPem), 0, "SHA-256", new Uint8Array(content).buffer, engine);
  const info = new ContentInfo({ contentType: OID.signedData, content: signed.toSchema(true) });
  return new Uint8Array(info.toSchema().toBER(false));
}

// In this order their encodings grow, as DER asks of a SET OF.
const signedAttributes = (content: Uint8Array, certificate: Uint8Array) => [
  attribute(OID.contentType, new ObjectIdentifier({ value: OID.data })),
  attribute(OID.messageDigest, new OctetString({ valueHex: sha256(content) })),
  // ESSCertIDv2 with SHA-256, which is the default and therefore not written.
  attribute(OID.signingCertificateV2, nest(nest(nest(new OctetString({ valueHex: sha256(certificate) }))))),
];

const attribute = (type: string, value: ObjectIdentifier | OctetString | Sequence) =>
  new Attribute({ type, values: [value] });
const nest = (value: OctetString | Sequence) => new Sequence({ value: [value] });
const sha256 = (bytes: Uint8Array) => new Uint8Array(createHash("sha256").update(bytes).digest()).buffer;

const signingKey = (pem: string) =>
  webcrypto.subtle.importKey(
    "pkcs8",
    createPrivateKey(pem).export({ type: "pkcs8", format: "der" }),
    { name: "ECDSA", namedCurve: "P-256" },
    false,
    ["sign"],
  );
