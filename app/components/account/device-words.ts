const browsers: [RegExp, string][] = [
  [/Edg(?:e|A|iOS)?\//, "Edge"],
  [/OPR\//, "Opera"],
  [/(?:Firefox|FxiOS)\//, "Firefox"],
  [/(?:Chrome|CriOS|Chromium)\//, "Chrome"],
  [/Safari\//, "Safari"],
];

const systems: [RegExp, string][] = [
  [/iPhone/, "iPhone"],
  [/iPad/, "iPad"],
  [/Android/, "Android"],
  [/Windows/, "Windows"],
  [/Macintosh/, "Mac"],
  [/Linux|X11/, "Linux"],
];

/**
 * A browser as a person would call it, from how it names itself.
 * @example deviceWords("Mozilla/5.0 (X11; Linux x86_64; rv:140.0) Gecko/20100101 Firefox/140.0") // "Firefox on Linux"
 */
export function deviceWords(agent: string): string {
  const browser = browsers.find(([pattern]) => pattern.test(agent))?.[1];
  const system = systems.find(([pattern]) => pattern.test(agent))?.[1];
  if (browser && system) return `${browser} on ${system}`;
  return browser ?? system ?? "Unknown browser";
}
