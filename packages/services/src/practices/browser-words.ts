const browsers: readonly [RegExp, string][] = [
  [/Edg\//, "Edge"],
  [/Firefox\//, "Firefox"],
  [/Chrom(e|ium)\//, "Chrome"],
  [/Safari\//, "Safari"],
];

const systems: readonly [RegExp, string][] = [
  [/iPad|iPhone/, "an iPad or iPhone"],
  [/Android/, "Android"],
  [/Windows/, "Windows"],
  [/Mac OS/, "a Mac"],
  [/Linux/, "Linux"],
];

/** "Firefox on Windows", enough to know one's own devices again. The order matters: each claims to be those below it. */
export function browserWords(userAgent: string): string {
  const browser = browsers.find(([pattern]) => pattern.test(userAgent))?.[1] ?? "A browser";
  const system = systems.find(([pattern]) => pattern.test(userAgent))?.[1];
  return system === undefined ? browser : `${browser} on ${system}`;
}
