import { createHash } from "node:crypto";
import { beforeAll, describe, expect, test, vi } from "vitest";
import type { IssuerKeyFiles } from "@/lib/certificates/makeIssuerKey";
import { signPdf } from "@/lib/certificates/signPdf";
import { LARGEST_PDF_BYTES, verifyPdf } from "@/lib/certificates/verifyPdf";
import { drawn, issuerKey, issuerKeyFiles, SIGNED_AT } from "./issued";

vi.setConfig({ testTimeout: 120_000, hookTimeout: 60_000 });

let files: IssuerKeyFiles;
let stranger: IssuerKeyFiles;
let unsigned: Uint8Array;
let fingerprint: string;
let signed: Buffer;
beforeAll(async () => {
  files = await issuerKeyFiles();
  // The same names, another key.
  stranger = await issuerKeyFiles();
  ({ pdf: unsigned, fingerprint } = await drawn());
  signed = Buffer.from(await signPdf(unsigned, issuerKey(files), SIGNED_AT));
});

const verify = (pdf: Uint8Array) => verifyPdf(pdf, files);
const text = (pdf: Uint8Array) => Buffer.from(pdf).toString("latin1");
const bytes = (latin1: string) => Buffer.from(latin1, "latin1");

describe("a certificate as issued", () => {
  test("is genuine, whole, and says which it is", async () => {
    expect(await verify(signed)).toEqual({
      signature: "genuine",
      wholeFile: true,
      number: "LM-7K4Q0-2M9XB-0",
      fingerprint,
      sha256: createHash("sha256").update(signed).digest("hex"),
      signerName: "Lagmark test issuer of certificates (Demonstration)",
    });
  });

  test("is genuine from a slice of a larger buffer too", async () => {
    const larger = Buffer.concat([Buffer.from("before"), signed, Buffer.from("after")]);
    expect(await verify(larger.subarray(6, 6 + signed.length))).toMatchObject({
      signature: "genuine",
      wholeFile: true,
    });
  });

  test("is genuine whatever its holder is called", async () => {
    const name = "/Keywords (LM) /ByteRange [0 1 2 3] Tables";
    const { pdf } = await drawn({ holder: { name } });
    expect(await verify(await signPdf(pdf, issuerKey(files), SIGNED_AT))).toMatchObject({
      signature: "genuine",
      number: "LM-7K4Q0-2M9XB-0",
    });
  });
});

describe("a changed file", () => {
  test("is never genuine: bytes all over the file, one at a time", async () => {
    for (let place = 5; place < signed.length; place += 997) {
      const changed = Buffer.from(signed);
      changed[place] ^= 1;
      const { signature } = await verify(changed);
      expect(signature, `byte ${place}`).not.toBe("genuine");
    }
  });

  test("is never genuine: bytes of the signature itself, one at a time", async () => {
    const start = text(signed).indexOf("/Contents <") + "/Contents <".length;
    const length = text(signed).indexOf(">", start) - start;
    for (let place = 0; place < length; place += place < 3000 ? 23 : 1999) {
      const changed = Buffer.from(signed);
      changed.write(changed[start + place] === 0x30 ? "1" : "0", start + place);
      const { signature } = await verify(changed);
      expect(signature, `figure ${place}`).not.toBe("genuine");
    }
  });

  test("is altered when a byte of the page is another", async () => {
    const changed = Buffer.from(signed);
    changed[text(signed).indexOf("stream") + 20] ^= 0x40;
    expect(await verify(changed)).toMatchObject({ signature: "altered", wholeFile: true });
  });

  test("is altered when another number stands in its description", async () => {
    const hex = (words: string) => Buffer.from(words, "utf16le").swap16().toString("hex").toUpperCase();
    const changed = bytes(text(signed).replace(hex("LM-7K4Q0-2M9XB-0"), hex("LM-00000-00000-2")));
    expect(changed.equals(signed)).toBe(false);
    expect((await verify(changed)).signature).toBe("altered");
  });

  test("with bytes appended is altered and not whole", async () => {
    for (const added of ["\n", "%%EOF", "\n1 0 obj\n<<>>\nendobj\nstartxref\n0\n%%EOF\n"]) {
      const longer = Buffer.concat([signed, Buffer.from(added)]);
      expect(await verify(longer), JSON.stringify(added)).toMatchObject({ signature: "altered", wholeFile: false });
    }
  });

  test("with bytes put before it is not genuine", async () => {
    const shifted = Buffer.concat([Buffer.from("%PDF-1.7\n"), signed]);
    expect((await verify(shifted)).signature).not.toBe("genuine");
  });

  test("with something hidden behind the signature in its place is not genuine", async () => {
    const end = text(signed).indexOf(">", text(signed).indexOf("/Contents <"));
    const changed = Buffer.from(signed);
    changed.write("deadbeef", end - 8);
    expect((await verify(changed)).signature).toBe("unreadable");
  });

  test("with a signature written in capitals is not genuine: one file, one spelling", async () => {
    const start = text(signed).indexOf("/Contents <") + "/Contents <".length;
    const changed = Buffer.from(signed);
    changed.write(
      changed
        .subarray(start, start + 3000)
        .toString("latin1")
        .toUpperCase(),
      start,
    );
    expect((await verify(changed)).signature).not.toBe("genuine");
  });

  test("whose byte range leaves a part out is not genuine", async () => {
    const narrow = bytes(
      text(signed).replace(/\/ByteRange \[0 (\d+) (\d+) (\d+)\]/, (whole, a: string, b: string, c: string) =>
        `/ByteRange [0 ${a} ${b} ${Number(c) - 10}]`.padEnd(whole.length),
      ),
    );
    expect(await verify(narrow)).toMatchObject({ signature: "altered", wholeFile: false });
  });

  test("with the signature of another certificate is altered", async () => {
    const { pdf } = await drawn({ holder: { name: "Daud Fenwicx" } });
    const other = text(await signPdf(pdf, issuerKey(files), SIGNED_AT));
    const contents = (of: string) => of.slice(of.indexOf("/Contents <"), of.indexOf(">", of.indexOf("/Contents <")));
    const transplanted = bytes(other.replace(contents(other), contents(text(signed))));
    expect((await verify(transplanted)).signature).toBe("altered");
  });

  test("cut short at any place is not genuine", async () => {
    for (let length = 0; length < signed.length; length += 1511) {
      expect((await verify(signed.subarray(0, length))).signature, `${length} bytes`).not.toBe("genuine");
    }
  });
});

describe("signatures of others", () => {
  test("a file signed by a stranger of the same name has another signer", async () => {
    const forged = await signPdf(unsigned, issuerKey(stranger), SIGNED_AT);
    expect(await verify(forged)).toMatchObject({ signature: "other-signer", wholeFile: true });
  });

  test("the issuer's certificate with a stranger's key is altered", async () => {
    const forged = await signPdf(unsigned, { ...issuerKey(files), keyPem: stranger.keyPem }, SIGNED_AT);
    expect((await verify(forged)).signature).toBe("altered");
  });

  test("a second signature put after the file makes it altered", async () => {
    const second = text(await signPdf(unsigned, issuerKey(stranger), SIGNED_AT));
    expect(await verify(Buffer.concat([signed, bytes(second)]))).toMatchObject({
      signature: "altered",
      wholeFile: false,
    });
  });

  test("a certificate of ours under another name in the bag is not taken for the issuer's", async () => {
    const forged = await signPdf(
      unsigned,
      { ...issuerKey(stranger), chainPem: [files.certificatePem, files.rootPem] },
      SIGNED_AT,
    );
    expect((await verify(forged)).signature).toBe("other-signer");
  });

  test("a bag with a certificate more than the chain is altered", async () => {
    const stuffed = await signPdf(
      unsigned,
      { ...issuerKey(files), chainPem: [files.rootPem, stranger.rootPem] },
      SIGNED_AT,
    );
    expect((await verify(stuffed)).signature).toBe("altered");
  });
});

describe("no signature, no PDF", () => {
  test("an unsigned certificate has none, and its number is told all the same", async () => {
    expect(await verify(unsigned)).toMatchObject({
      signature: "absent",
      wholeFile: false,
      number: "LM-7K4Q0-2M9XB-0",
      fingerprint,
    });
  });

  test.each([
    ["nothing", ""],
    ["text", "LM-7K4Q0-2M9XB-0"],
    ["a head alone", "%PDF-"],
    ["an empty signature", "%PDF-1.7 /ByteRange [0 9 9 9] /Contents <>"],
    ["a range backwards", "%PDF-1.7 /ByteRange [9 9 0 0]"],
    ["a range out of the file", "%PDF-1.7 /ByteRange [0 5 9999999999 9999999999]"],
    ["a signature of nonsense", `%PDF-1.7 /ByteRange [0 29 37 0]<30023030>${"".padEnd(10)}`],
    ["a deep nest", `%PDF-1.7 /ByteRange [0 0035 8039 0001]<${"3080".repeat(2000)}>`],
    ["many signatures", `%PDF-1.7 ${"/ByteRange [0 1 2 3]".repeat(20_000)}`],
    ["a thousand descriptions", `%PDF-1.7 ${"/Keywords <FEFF0041>".repeat(1000)}`],
  ])("%s is no genuine certificate and no error", async (_what, junk) => {
    const verdict = await verify(bytes(junk));
    expect(["unreadable", "absent"]).toContain(verdict.signature);
    expect(verdict).toMatchObject({ wholeFile: false, number: null, fingerprint: null, signerName: null });
  });

  test("bytes drawn at random behind a right head are no error", async () => {
    for (let seed = 0; seed < 200; seed += 1) {
      const noise = createHash("shake256", { outputLength: 700 }).update(`noise ${seed}`).digest();
      const cms = Buffer.concat([Buffer.from([0x30, 0x82, 0x02, 0xb8]), noise.subarray(4)]).toString("hex");
      const head = "%PDF-1.7 /ByteRange [0 0040 1442 0000]  ";
      expect((await verify(bytes(`${head}<${cms}>`))).signature).toBe("unreadable");
    }
  });

  test("a file over ten megabytes is not read", async () => {
    const heavy = Buffer.concat([signed, Buffer.alloc(LARGEST_PDF_BYTES)]);
    expect(await verify(heavy)).toMatchObject({ signature: "unreadable", number: null });
  });
});

test("an issuer that the root did not certify is a fault of the installation, not of the file", async () => {
  await expect(verifyPdf(signed, { certificatePem: files.certificatePem, rootPem: stranger.rootPem })).rejects.toThrow(
    RangeError,
  );
});
