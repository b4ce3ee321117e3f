/** Serves dist/ over https on localhost, where the manifest says that Excel finds the add-in. */
import { X509Certificate } from "node:crypto";
import { createServer } from "node:https";
import { existsSync, readFileSync } from "node:fs";
import { homedir } from "node:os";
import { join, resolve } from "node:path";
import { getHttpsServerOptions } from "office-addin-dev-certs";
import { WRITTEN_FOR } from "./manifest";
import { answer } from "./start";

const dist = resolve(import.meta.dirname, "../../dist");
const { port, origin } = new URL(WRITTEN_FOR);

/** The development certificates that the package keeps in the home folder. */
const certificates = join(homedir(), ".office-addin-dev-certs");
const authority = join(certificates, "ca.crt");
const files = { cert: join(certificates, "localhost.crt"), key: join(certificates, "localhost.key") };

async function main(): Promise<void> {
  if (!readFileSync(join(dist, "manifest.xml"), "utf8").includes(`${WRITTEN_FOR}/`)) {
    throw new Error(`dist/ was built for another host; run this command without ADDIN_URL to serve ${WRITTEN_FOR}`);
  }
  const options = kept() ?? (await getHttpsServerOptions().catch(untrusted));
  const server = createServer(options, (request, response) => void answer(dist, request, response));
  server.on("error", (error: NodeJS.ErrnoException) => {
    console.error(error.code === "EADDRINUSE" ? `port ${port} is in use; the manifest needs it` : error.message);
    process.exitCode = 1;
  });
  server.listen(Number(port), "localhost", () =>
    console.log(`${HOW_TO.trim()}\n\nServing ${origin}. Stop with Ctrl+C.`),
  );
}

/** On Linux browsers keep their own authorities: a certificate once imported there is used until it expires. */
function kept() {
  if (process.platform !== "linux" || !existsSync(authority) || !existsSync(files.cert)) return undefined;
  const expires = Date.parse(new X509Certificate(readFileSync(files.cert)).validTo);
  return expires > Date.now() ? read() : undefined;
}

/** Certificates that could be made but not entered among the trusted ones, which needs an administrator. */
function untrusted(reason: Error) {
  if (!existsSync(files.cert) || !existsSync(files.key)) throw reason;
  console.error(
    `The certificate is not trusted on this machine yet: import ${authority} into the browser as a certificate ` +
      `authority, or open ${origin}/reference.html there and accept it.\n`,
  );
  return read();
}

function read() {
  return { cert: readFileSync(files.cert), key: readFileSync(files.key) };
}

const HOW_TO = `
Excel on the web: Home, Add-ins, More Add-ins, My Add-ins, Upload My Add-in: choose dist/manifest.xml.
Excel on Windows: put dist/manifest.xml into a shared folder that is listed under Options, Trust Center,
Trusted Add-in Catalogs; then Home, Add-ins, More Add-ins, Shared Folder.
Excel on a Mac: copy dist/manifest.xml to ~/Library/Containers/com.microsoft.Excel/Data/Documents/wef and restart Excel.
Then type =PLINTH.ABSTRANS(25, 8, 0.1) into a cell: 0.134 means that it works.
`;

main().catch((error: Error) => {
  console.error(error.message);
  process.exitCode = 1;
});
