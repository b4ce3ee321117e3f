/** The address that manifest/manifest.xml is written for; a build for another host replaces it. */
export const WRITTEN_FOR = "https://localhost:3000";

/**
 * The manifest for the host at `url`.
 * @throws Error when the address is not https, which Excel demands
 */
export function manifestFor(url: string, manifest: string): string {
  if (!URL.canParse(url))
    throw new Error(`ADDIN_URL must be an address such as https://example.org/plinth, got ${url}`);
  const { protocol, origin } = new URL(url);
  if (protocol !== "https:") throw new Error(`ADDIN_URL must be https, got ${url}`);
  return manifest
    .replaceAll(`<AppDomain>${WRITTEN_FOR}</AppDomain>`, `<AppDomain>${origin}</AppDomain>`)
    .replaceAll(`${WRITTEN_FOR}/`, `${url}/`);
}
