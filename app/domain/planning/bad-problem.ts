/**
 * One thing that is wrong with a problem: `code` for programs, `path` such as `songs[2].necks[0].open[5]` (empty for
 * the whole value), `message` what is wrong, `remedy` what to do.
 */
export type BadProblem = { code: string; path: string; message: string; remedy: string };

type Path = readonly PropertyKey[];

/**
 * A place in a JSON value as people write it.
 *
 * @example writePath(["songs", 2, "id"]) // "songs[2].id"
 */
export function writePath(path: Path): string {
  return path.reduce<string>((written, part) => {
    if (typeof part === "number") return `${written}[${part}]`;
    const name = String(part);
    if (!/^[A-Za-z_]\w*$/.test(name)) return `${written}[${JSON.stringify(name)}]`;
    return written === "" ? name : `${written}.${name}`;
  }, "");
}

export function bad(code: string, path: Path, message: string, remedy: string): BadProblem {
  return { code, path: writePath(path), message, remedy };
}
