/** Longest piece of somebody's cell that a message repeats. */
const SHOWN_CHARACTERS = 40;

/** A value on one line and short enough for a message; the dots show that it was longer. */
export function cutText(text: string, length = SHOWN_CHARACTERS): string {
  const characters = Array.from(
    text
      .slice(0, length * 2 + 2)
      .replace(/[\p{Cc}\p{Cf}\s]+/gu, " ")
      .trim(),
  );
  if (characters.length <= length && text.length <= length * 2 + 2) return characters.join("");
  return `${characters.slice(0, length).join("")}…`;
}
