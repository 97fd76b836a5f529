import { createReadStream, realpathSync, statSync } from "node:fs";
import type { IncomingMessage, ServerResponse } from "node:http";
import path from "node:path";

/** Only these kinds of file leave the folder. */
const MIME_TYPES: Readonly<Record<string, string>> = {
  ".html": "text/html; charset=utf-8",
  ".js": "text/javascript; charset=utf-8",
  ".css": "text/css; charset=utf-8",
  ".json": "application/json; charset=utf-8",
  ".map": "application/json; charset=utf-8",
  ".xml": "application/xml; charset=utf-8",
  ".txt": "text/plain; charset=utf-8",
  ".md": "text/plain; charset=utf-8",
  ".png": "image/png",
  ".woff2": "font/woff2",
};

/**
 * Nothing from another place, no text run as code. Styles may stand in the page because the grid library positions its parts by
 * style attributes; data: and blob: pictures because it draws its marks with them.
 */
export const CONTENT_SECURITY_POLICY = [
  "default-src 'none'",
  "script-src 'self'",
  "style-src 'self' 'unsafe-inline'",
  "img-src 'self' data: blob:",
  "font-src 'self'",
  "connect-src 'self'",
  "base-uri 'none'",
  "form-action 'none'",
  "frame-ancestors 'none'",
].join("; ");

const LOOPBACK_NAMES = ["127.0.0.1", "localhost"];

/** Answers requests with the files below `folder`; `port` is asked at each request because it is known only once we listen. */
export function benchHandler(folder: string, port: () => number): (request: IncomingMessage, response: ServerResponse) => void {
  const root = realpathSync(folder);
  return (request, response) => {
    response.setHeader("Content-Security-Policy", CONTENT_SECURITY_POLICY);
    response.setHeader("X-Content-Type-Options", "nosniff");
    response.setHeader("Referrer-Policy", "no-referrer");
    response.setHeader("Cross-Origin-Opener-Policy", "same-origin");
    response.setHeader("Cross-Origin-Resource-Policy", "same-origin");
    response.setHeader("Cache-Control", "no-cache");
    // A page elsewhere can point its own name at 127.0.0.1; its requests carry that name.
    if (!LOOPBACK_NAMES.some((name) => request.headers.host === `${name}:${port()}`)) return refuse(request, response, 403, "This server answers only to its own address on this machine.");
    if (request.method !== "GET" && request.method !== "HEAD") {
      response.setHeader("Allow", "GET, HEAD");
      return refuse(request, response, 405, "Only GET and HEAD are answered here.");
    }
    const file = fileOf(root, request.url ?? "/");
    if (file === undefined) return refuse(request, response, 404, "There is no such page here.");
    response.writeHead(200, { "Content-Type": MIME_TYPES[path.extname(file.path)]!, "Content-Length": file.size });
    if (request.method === "HEAD") return void response.end();
    createReadStream(file.path)
      .on("error", (error) => response.destroy(error))
      .pipe(response);
  };
}

/** The file a request means, or undefined when it is none of ours: outside the folder (links included), hidden, of no known kind. */
function fileOf(root: string, url: string): { path: string; size: number } | undefined {
  let wanted: string;
  try {
    wanted = decodeURIComponent(url.split(/[?#]/, 1)[0]!);
  } catch {
    return undefined; // not percent-encoded text
  }
  if (!wanted.startsWith("/") || /[\0\\]/.test(wanted) || wanted.split("/").some((part) => part.startsWith("."))) return undefined;
  const candidate = path.join(root, wanted.endsWith("/") ? wanted + "index.html" : wanted);
  if (!(path.extname(candidate) in MIME_TYPES)) return undefined;
  const found = statSync(candidate, { throwIfNoEntry: false });
  if (!found?.isFile()) return undefined;
  const real = realpathSync(candidate);
  return real.startsWith(root + path.sep) ? { path: real, size: found.size } : undefined;
}

function refuse(request: IncomingMessage, response: ServerResponse, status: number, sentence: string): void {
  const body = sentence + "\n";
  response.writeHead(status, { "Content-Type": "text/plain; charset=utf-8", "Content-Length": Buffer.byteLength(body) });
  response.end(request.method === "HEAD" ? undefined : body);
}
