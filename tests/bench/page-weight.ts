import { gzipSync } from "node:zlib";

/** Bytes of gzipped script that a page asks for in its HTML: every script and every script that is loaded ahead. */
export async function scriptBytes(base: string, path: string, cookie: string): Promise<number> {
  const page = await fetch(`${base}${path}`, { headers: { cookie }, redirect: "manual" });
  if (page.status !== 200) throw new Error(`${path} answered ${page.status}.`);
  const html = await page.text();
  const addresses = new Set(
    [...html.matchAll(/(?:src|href)="([^"]+\.js[^"]*)"/g)].map((match) => match[1] ?? ""),
  );
  let total = 0;
  for (const address of addresses) {
    const answer = await fetch(new URL(address, base));
    total += gzipSync(Buffer.from(await answer.arrayBuffer())).length;
  }
  return total;
}
