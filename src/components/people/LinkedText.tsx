/** Plain text whose addresses are links; line breaks stay. */
export function LinkedText({ text }: { readonly text: string }) {
  const pieces = text.split(/(https?:\/\/\S+)/);
  return (
    <div className="border border-rule bg-surface p-4 text-base break-words whitespace-pre-wrap">
      {pieces.map((piece, i) =>
        i % 2 === 0 ? (
          piece
        ) : (
          <a key={piece} href={piece} className="break-all underline underline-offset-2">
            {piece}
          </a>
        ),
      )}
    </div>
  );
}
