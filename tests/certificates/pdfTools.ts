import { execFileSync, spawnSync } from "node:child_process";
import { mkdtempSync, readFileSync, rmSync, writeFileSync } from "node:fs";
import { tmpdir } from "node:os";
import path from "node:path";

/** Independent readers of PDF, so that our files are not judged by the libraries that wrote them. */
export class PdfTools {
  readonly folder = mkdtempSync(path.join(tmpdir(), "certificate-"));

  remove(): void {
    rmSync(this.folder, { recursive: true, force: true });
  }

  file(name: string, bytes: Uint8Array | string): string {
    const at = path.join(this.folder, name);
    writeFileSync(at, bytes);
    return at;
  }

  text = (pdf: string, ...options: string[]) => execFileSync("pdftotext", [...options, pdf, "-"], { encoding: "utf8" });
  info = (pdf: string) => execFileSync("pdfinfo", [pdf], { encoding: "utf8" });
  fonts = (pdf: string) => execFileSync("pdffonts", [pdf], { encoding: "utf8" });
  attachment = (pdf: string, name: string) => execFileSync("qpdf", [`--show-attachment=${name}`, pdf]);

  /** Exit code 0 means neither errors nor warnings. */
  check(pdf: string) {
    const { status, stdout, stderr } = spawnSync("qpdf", ["--check", pdf], { encoding: "utf8" });
    return { status, output: stdout + stderr };
  }

  /** What a common viewer says when it trusts the root. */
  signature(pdf: string, rootPem: string): string {
    const database = `sql:${this.folder}`;
    execFileSync("certutil", ["-N", "-d", database, "--empty-password"]);
    execFileSync("certutil", ["-A", "-d", database, "-n", "root", "-t", "C,C,C", "-i", this.file("root.pem", rootPem)]);
    return spawnSync("pdfsig", ["-nssdir", database, pdf], { encoding: "utf8" }).stdout;
  }

  /** The page as pixels, RGB from the top left. */
  raster(pdf: string, dotsPerInch: number) {
    execFileSync("pdftoppm", ["-r", String(dotsPerInch), "-singlefile", pdf, path.join(this.folder, "page")]);
    const bytes = readFileSync(path.join(this.folder, "page.ppm"));
    const head = /^P6\s+(\d+)\s+(\d+)\s+255\s/.exec(bytes.subarray(0, 64).toString("latin1"));
    if (!head) throw new Error("raster: not a P6 picture");
    const width = Number(head[1]);
    return {
      width,
      height: Number(head[2]),
      /** The colour at a place given in points from the top left. */
      at: (xPt: number, yPt: number) => {
        const pixel = Math.floor((yPt * dotsPerInch) / 72) * width + Math.floor((xPt * dotsPerInch) / 72);
        return [...bytes.subarray(head[0].length + 3 * pixel, head[0].length + 3 * pixel + 3)] as [
          number,
          number,
          number,
        ];
      },
    };
  }
}
