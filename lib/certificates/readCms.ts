import { createHash, verify, X509Certificate } from "node:crypto";
import { Constructed, fromBER, Null, OctetString, Sequence, type AsnType } from "asn1js";
import {
  type AlgorithmIdentifier,
  Certificate,
  ContentInfo,
  IssuerAndSerialNumber,
  SignedData,
  type SignerInfo,
} from "pkijs";
import { OID } from "./pades";

/** What a signature says of itself: who signed, whether the bytes are the signed ones, whether the signature is that signer's. */
export type CmsReading = {
  signer: X509Certificate;
  /** Every certificate in the signature as DER, the signer's among them. */
  certificates: Buffer[];
  digestAgrees: boolean;
  signatureAgrees: boolean;
};

const SHA_256 = "2.16.840.1.101.3.4.2.1"; // RFC 5754, section 2.2
const ECDSA_WITH_SHA_256 = "1.2.840.10045.4.3.2"; // RFC 5758, section 3.2

/** Reads a detached CMS with exactly one signer, in strict encoding; null when it is anything else. Throws on junk. */
export function readCms(cms: Uint8Array, signedParts: readonly Uint8Array[]): CmsReading | null {
  const content = ContentInfo.fromBER(new Uint8Array(cms));
  if (content.contentType !== OID.signedData) return null;
  const signed = new SignedData({ schema: content.content });
  const [info, ...others] = signed.signerInfos;
  if (!info?.signedAttrs || others.length > 0 || !isPlain(signed, info) || !isStrict(cms, signed)) return null;
  const certificates = certificatesIn(cms);
  const named = certificates.find((certificate) => isNamedBy(info, Certificate.fromBER(new Uint8Array(certificate))));
  if (!named) return null;
  const signer = new X509Certificate(named);
  return {
    signer,
    certificates,
    digestAgrees: digestAgrees(info, signedParts),
    signatureAgrees: signatureAgrees(info, signer) && namesItsCertificate(info, signer),
  };
}

/** RFC 5652, 5.1 and 5.3: what a detached signature over plain data, its signer named by issuer and serial number, must say. */
const isPlain = (signed: SignedData, info: SignerInfo): boolean =>
  signed.version === 1 &&
  info.version === 1 &&
  signed.encapContentInfo.eContentType === OID.data &&
  !signed.encapContentInfo.eContent &&
  [...signed.digestAlgorithms, info.digestAlgorithm].every(isSha256) &&
  signed.digestAlgorithms.length === 1;

/** RFC 5754, section 2: parameters absent or NULL. */
const isSha256 = ({ algorithmId, algorithmParams }: AlgorithmIdentifier): boolean =>
  algorithmId === SHA_256 && (algorithmParams === undefined || algorithmParams instanceof Null);

/** Written anew it must give the same bytes: otherwise something stands in the signature that was read past. */
function isStrict(cms: Uint8Array, signed: SignedData): boolean {
  const anew = new ContentInfo({ contentType: OID.signedData, content: signed.toSchema(true) }).toSchema().toBER(false);
  return Buffer.from(anew).equals(cms);
}

const isNamedBy = ({ sid }: SignerInfo, { issuer, serialNumber }: Certificate): boolean =>
  sid instanceof IssuerAndSerialNumber && serialNumber.isEqual(sid.serialNumber) && issuer.isEqual(sid.issuer);

/** The bytes as they stand in the file; written anew by a library they could be other bytes. RFC 5652, 5.1: tag [0]. */
function certificatesIn(cms: Uint8Array): Buffer[] {
  const [, content] = children(fromBER(new Uint8Array(cms)).result);
  const bag = children(children(content)[0]).find(({ idBlock }) => idBlock.tagClass === 3 && idBlock.tagNumber === 0);
  return children(bag).map((certificate) => Buffer.from(certificate.valueBeforeDecodeView));
}

const children = (block: AsnType | undefined): AsnType[] =>
  block instanceof Constructed || block instanceof Sequence ? (block.valueBlock.value as AsnType[]) : [];

function digestAgrees(info: SignerInfo, signedParts: readonly Uint8Array[]): boolean {
  const value = attributeValue(info, OID.messageDigest);
  const hash = createHash("sha256");
  signedParts.forEach((part) => hash.update(part));
  const digest = value instanceof OctetString ? Buffer.from(value.valueBlock.valueHexView) : Buffer.alloc(0);
  return digest.equals(hash.digest());
}

function signatureAgrees(info: SignerInfo, signer: X509Certificate): boolean {
  if (!info.signedAttrs || info.signatureAlgorithm.algorithmId !== ECDSA_WITH_SHA_256) return false;
  const attributes = Buffer.from(info.signedAttrs.encodedValue);
  // RFC 5652, 5.4: what is signed carries the SET OF tag, not the implicit tag it has in the file.
  attributes[0] = 0x31;
  return verify("sha256", attributes, signer.publicKey, Buffer.from(info.signature.valueBlock.valueHexView));
}

/** RFC 5035: without this check another certificate with the same key could be put in. */
function namesItsCertificate(info: SignerInfo, signer: X509Certificate): boolean {
  const hash = firstOctets(attributeValue(info, OID.signingCertificateV2));
  return hash !== null && hash.equals(createHash("sha256").update(signer.raw).digest());
}

function attributeValue(info: SignerInfo, type: string): AsnType | undefined {
  const found = info.signedAttrs?.attributes.filter((attribute) => attribute.type === type) ?? [];
  if (found.length !== 1 || found[0].values.length !== 1) return undefined;
  // A fresh parse: pkijs types the values as anything.
  return fromBER(found[0].values[0].toBER(false)).result;
}

/** The first octet string down the first branch: SigningCertificateV2 > certs > ESSCertIDv2 > certHash. */
function firstOctets(value: AsnType | undefined): Buffer | null {
  if (value instanceof OctetString) return Buffer.from(value.valueBlock.valueHexView);
  return value instanceof Sequence ? firstOctets(value.valueBlock.value[0] as AsnType | undefined) : null;
}
