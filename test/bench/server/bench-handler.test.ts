import { mkdirSync, mkdtempSync, rmSync, symlinkSync, writeFileSync } from "node:fs";
import { createServer, request as httpRequest, type Server } from "node:http";
import type { AddressInfo } from "node:net";
import os from "node:os";
import path from "node:path";
import { benchHandler, CONTENT_SECURITY_POLICY } from "../../../src/bench/server/bench-handler";

interface Answer {
  status: number;
  headers: Record<string, string | string[] | undefined>;
  body: string;
}

let folder: string;
let server: Server;
let port: number;

beforeAll(async () => {
  folder = mkdtempSync(path.join(os.tmpdir(), "bench-handler-"));
  mkdirSync(path.join(folder, "dist/engine"), { recursive: true });
  writeFileSync(path.join(folder, "secret.txt"), "secret");
  writeFileSync(path.join(folder, "dist/index.html"), "<!doctype html>start θ");
  writeFileSync(path.join(folder, "dist/engine/a.js"), "1");
  writeFileSync(path.join(folder, "dist/.hidden.txt"), "hidden");
  writeFileSync(path.join(folder, "dist/program.exe"), "MZ");
  symlinkSync(path.join(folder, "secret.txt"), path.join(folder, "dist/link.txt"));
  server = createServer(benchHandler(path.join(folder, "dist"), () => port));
  await new Promise<void>((resolve) => server.listen(0, "127.0.0.1", resolve));
  port = (server.address() as AddressInfo).port;
});

afterAll(async () => {
  await new Promise((resolve) => server.close(resolve));
  rmSync(folder, { recursive: true });
});

/** The path goes out as written: no client tidies its dots away. */
function ask(url: string, { method = "GET", host = `127.0.0.1:${port}` } = {}): Promise<Answer> {
  return new Promise((resolve, reject) => {
    const sent = httpRequest({ host: "127.0.0.1", port, path: url, method, headers: { host }, agent: false }, (response) => {
      let body = "";
      response.setEncoding("utf8");
      response.on("data", (data: string) => (body += data));
      response.on("end", () => resolve({ status: response.statusCode!, headers: response.headers, body }));
    });
    sent.on("error", reject);
    sent.end();
  });
}

describe("the bench server", () => {
  it("gives the start page at /, with its type, length and policy", async () => {
    const answer = await ask("/");
    expect(answer.status).toBe(200);
    expect(answer.body).toBe("<!doctype html>start θ");
    expect(answer.headers).toMatchObject({ "content-type": "text/html; charset=utf-8", "content-length": "23", "content-security-policy": CONTENT_SECURITY_POLICY, "x-content-type-options": "nosniff" });
  });

  it("allows no script, connection or frame of another place, and no text run as code", () => {
    expect(CONTENT_SECURITY_POLICY).toContain("default-src 'none'");
    expect(CONTENT_SECURITY_POLICY).toContain("script-src 'self';");
    expect(CONTENT_SECURITY_POLICY).not.toContain("unsafe-eval");
    expect(CONTENT_SECURITY_POLICY).not.toMatch(/https?:/);
  });

  it("gives files of sub-folders by their type and ignores the query", async () => {
    expect(await ask("/engine/a.js?v=1")).toMatchObject({ status: 200, body: "1", headers: { "content-type": "text/javascript; charset=utf-8" } });
  });

  it("answers HEAD with the headers alone", async () => {
    expect(await ask("/", { method: "HEAD" })).toMatchObject({ status: 200, body: "", headers: { "content-length": "23" } });
    expect(await ask("/none.js", { method: "HEAD" })).toMatchObject({ status: 404, body: "" });
  });

  it.each(["POST", "PUT", "DELETE", "OPTIONS"])("refuses %s with 405 and says what is allowed", async (method) => {
    expect(await ask("/", { method })).toMatchObject({ status: 405, headers: { allow: "GET, HEAD" } });
  });

  it.each([
    "/../secret.txt",
    "/engine/../../secret.txt",
    "/%2e%2e/secret.txt",
    "/..%2fsecret.txt",
    "/%2e%2e%2fsecret.txt",
    "/..\\secret.txt",
    "/..%5csecret.txt",
    "//etc/passwd",
    "/link.txt",
    "/.hidden.txt",
    "/index.html%00.js",
    "/%zz",
    "/engine",
    "/program.exe",
    "/none.html",
  ])("does not give %s", async (url) => {
    const answer = await ask(url);
    expect(answer).toMatchObject({ status: 404, body: "There is no such page here.\n" });
  });

  it.each(["example.org", "example.org:80", "127.0.0.1.example.org", "127.0.0.1", "localhost:1"])("refuses a request that calls it %s", async (host) => {
    expect(await ask("/", { host })).toMatchObject({ status: 403, body: "This server answers only to its own address on this machine.\n" });
  });

  it("answers as localhost too", async () => {
    expect(await ask("/", { host: `localhost:${port}` })).toMatchObject({ status: 200 });
  });
});
