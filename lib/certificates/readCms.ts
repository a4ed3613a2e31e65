import { createHash, verify, X509Certificate } from "node:crypto";
import { fromBER, OctetString, Sequence, type AsnType } from "asn1js";
import { ContentInfo, IssuerAndSerialNumber, SignedData, type Certificate, type SignerInfo } from "pkijs";
import { OID } from "./pades";

/** What a signature says of itself: who signed, whether the bytes are the signed ones, whether the signature is that signer's. */
export type CmsReading = { signer: X509Certificate; digestAgrees: boolean; signatureAgrees: boolean };

const SHA_256 = "2.16.840.1.101.3.4.2.1"; // NIST CSOR, RFC 5754, section 2.2
const ECDSA_WITH_SHA_256 = "1.2.840.10045.4.3.2"; // RFC 5758, section 3.2

/** Reads a detached CMS with exactly one signer; null when it is anything else. Throws on junk. */
export function readCms(cms: Uint8Array, signedParts: readonly Uint8Array[]): CmsReading | null {
  const content = ContentInfo.fromBER(new Uint8Array(cms));
  if (content.contentType !== OID.signedData) return null;
  const signed = new SignedData({ schema: content.content });
  const [info, ...others] = signed.signerInfos;
  const certificate = info && signerCertificate(signed, info);
  if (!certificate || others.length > 0 || !info.signedAttrs || signed.encapContentInfo.eContent) return null;
  const signer = new X509Certificate(Buffer.from(certificate.toSchema(false).toBER(false)));
  return {
    signer,
    digestAgrees: digestAgrees(info, signedParts),
    signatureAgrees: signatureAgrees(info, signer) && namesItsCertificate(info, signer),
  };
}

function signerCertificate(signed: SignedData, info: SignerInfo): Certificate | undefined {
  const { sid } = info;
  if (!(sid instanceof IssuerAndSerialNumber)) return undefined;
  return signed.certificates?.find(
    (found): found is Certificate =>
      "serialNumber" in found && found.serialNumber.isEqual(sid.serialNumber) && found.issuer.isEqual(sid.issuer),
  );
}

function digestAgrees(info: SignerInfo, signedParts: readonly Uint8Array[]): boolean {
  const value = attributeValue(info, OID.messageDigest);
  const hash = createHash("sha256");
  signedParts.forEach((part) => hash.update(part));
  const digest = value instanceof OctetString ? Buffer.from(value.valueBlock.valueHexView) : Buffer.alloc(0);
  return info.digestAlgorithm.algorithmId === SHA_256 && digest.equals(hash.digest());
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
