/** A shape's letter in its circle. A mirrored shape has "r" after it and says so. */
export function PatchLetter({ letter }: { letter: string }) {
  const mirrored = letter.length > 1 && letter.endsWith("r");
  return (
    <span className="letter">
      {letter}
      {mirrored ? <span className="sr">, mirror image</span> : null}
    </span>
  );
}
