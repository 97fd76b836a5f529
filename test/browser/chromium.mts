// Starts a headless Chromium: $CHROMIUM where set, otherwise the one inside @sparticuz/chromium, which needs no browser, no system
// library beyond glibc and no font of the machine's.
import { existsSync, mkdirSync, readFileSync, rmSync, writeFileSync } from "node:fs";
import os from "node:os";
import path from "node:path";
import { chromium, type Browser } from "playwright-core";

/** Our own flags: the package's own switch web security off. */
const FLAGS = ["--no-sandbox", "--disable-gpu", "--disable-quic", "--no-first-run", "--disable-background-networking", "--disable-component-update", "--disable-sync", "--font-render-hinting=none"];

export async function launch(): Promise<Browser> {
  return chromium.launch({ executablePath: process.env.CHROMIUM ?? (await unpacked()), headless: true, args: FLAGS });
}

/** Unpacks the package's Chromium once per version and account, and lets it see its own fonts first. */
async function unpacked(): Promise<string> {
  const { version } = JSON.parse(readFileSync(new URL("../../node_modules/@sparticuz/chromium/package.json", import.meta.url), "utf8")) as { version: string };
  // The package unpacks into the temporary folder and takes whatever lies there: give each version its own.
  const home = path.join(os.tmpdir(), `wallsheet-chromium-${version}-${os.userInfo().uid}`);
  const complete = path.join(home, "complete");
  // An unpacking that was interrupted leaves half a browser, which the package would take for a whole one.
  if (!existsSync(complete)) rmSync(home, { recursive: true, force: true });
  mkdirSync(home, { recursive: true, mode: 0o700 });
  process.env.TMPDIR = home;
  // Makes the package unpack its own NSS, NSPR and expat and put them on LD_LIBRARY_PATH.
  process.env.AWS_LAMBDA_JS_RUNTIME ??= "nodejs20.x";
  process.env.FONTCONFIG_FILE = fontsFile(home);
  const { default: packaged } = await import("@sparticuz/chromium");
  const executable = await packaged.executablePath();
  writeFileSync(complete, "");
  return executable;
}

/**
 * The package's fonts (Open Sans) and, only where WALLSHEET_SYSTEM_FONTS is set, the machine's: pictures and layout then come out
 * alike on every machine. Without any font each text box would be 0 px high.
 */
function fontsFile(home: string): string {
  const folders = [path.join(home, "fonts"), ...(process.env.WALLSHEET_SYSTEM_FONTS ? ["/usr/share/fonts"] : [])];
  const file = path.join(home, process.env.WALLSHEET_SYSTEM_FONTS ? "fonts-system.conf" : "fonts-own.conf");
  if (!existsSync(file)) {
    writeFileSync(
      file,
      `<?xml version="1.0"?><!DOCTYPE fontconfig SYSTEM "fonts.dtd"><fontconfig>${folders.map((folder) => `<dir>${folder}</dir>`).join("")}<cachedir>${home}/fonts-cache</cachedir></fontconfig>`,
    );
  }
  return file;
}
