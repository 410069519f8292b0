/** Something the person who started the program can put right: its message is all they are shown. */
export class PlainError extends Error {
  override name = "PlainError";
}
