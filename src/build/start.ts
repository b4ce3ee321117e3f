/** Serves dist/ on localhost and opens the trial sheet. Nothing is reachable from other machines. */
import { spawn } from "node:child_process";
import { createReadStream } from "node:fs";
import { stat } from "node:fs/promises";
import { type IncomingMessage, type Server, type ServerResponse, createServer } from "node:http";
import { dirname, extname, join, resolve, sep } from "node:path";
import { fileURLToPath, pathToFileURL } from "node:url";

const types: Record<string, string> = {
  ".html": "text/html; charset=utf-8",
  ".js": "text/javascript; charset=utf-8",
  ".css": "text/css; charset=utf-8",
  ".json": "application/json; charset=utf-8",
  ".map": "application/json; charset=utf-8",
  ".xml": "application/xml; charset=utf-8",
  ".svg": "image/svg+xml",
  ".png": "image/png",
  ".txt": "text/plain; charset=utf-8",
  ".woff": "font/woff",
  ".woff2": "font/woff2",
  ".xlsx": "application/vnd.openxmlformats-officedocument.spreadsheetml.sheet",
};

/** The file under root that a request names, or nothing when the path leads outside. */
function fileOf(root: string, url: string): string | undefined {
  let path: string;
  try {
    path = decodeURIComponent(new URL(url, "http://localhost").pathname);
  } catch {
    return undefined;
  }
  const file = resolve(root, "." + (path.endsWith("/") ? path + "index.html" : path));
  return file.startsWith(root + sep) && !path.includes("\0") ? file : undefined;
}

export async function answer(root: string, request: IncomingMessage, response: ServerResponse): Promise<void> {
  if (request.method !== "GET" && request.method !== "HEAD") return void response.writeHead(405).end();
  const file = fileOf(root, request.url ?? "/");
  const found = file === undefined ? undefined : await stat(file).catch(() => undefined);
  if (found?.isDirectory()) {
    const [path, query] = (request.url ?? "/").split("?");
    return void response.writeHead(302, { Location: `${path}/${query ? `?${query}` : ""}` }).end();
  }
  if (!file || !found?.isFile())
    return void response.writeHead(404, { "Content-Type": types[".txt"] }).end("not found");
  response.writeHead(200, {
    "Content-Type": types[extname(file)] ?? "application/octet-stream",
    "Content-Length": found.size,
    "Cache-Control": "no-cache",
    "X-Content-Type-Options": "nosniff",
  });
  if (request.method === "HEAD") return void response.end();
  createReadStream(file)
    .on("error", () => response.destroy())
    .pipe(response);
}

/** Listens on this machine alone; port 0 takes any free one. */
export function serve(root: string, port: number): Promise<Server> {
  const server = createServer((request, response) => void answer(resolve(root), request, response));
  return new Promise((done, fail) => {
    server.once("error", fail);
    server.listen(port, "localhost", () => done(server));
  });
}

function openBrowser(address: string): void {
  const [command, ...args] = {
    darwin: ["open", address],
    win32: ["cmd", "/c", "start", "", address],
  }[process.platform as string] ?? ["xdg-open", address];
  const child = spawn(command as string, args, { stdio: "ignore", detached: true });
  child.on("error", () => {});
  child.unref();
}

async function main(): Promise<void> {
  const root = join(dirname(fileURLToPath(import.meta.url)), "..", "..", "dist");
  const port = Number(process.env["PORT"] ?? 4173);
  if (!Number.isInteger(port) || port < 0 || port > 65535)
    throw new Error(`PORT must be 0 to 65535, got ${process.env["PORT"]}`);
  const server = await serve(root, port).catch((error: NodeJS.ErrnoException) => {
    if (error.code === "EADDRINUSE") throw new Error(`port ${port} is in use; choose another: PORT=4200 npm start`);
    throw error;
  });
  const bound = server.address();
  const address = `http://localhost:${typeof bound === "object" ? bound?.port : port}/trial/`;
  console.log(`Plinth trial sheet: ${address}\nStop with Ctrl+C.`);
  openBrowser(address);
}

if (process.argv[1] && import.meta.url === pathToFileURL(process.argv[1]).href)
  main().catch((error: Error) => {
    console.error(error.message);
    process.exitCode = 1;
  });
