/** Text of a file as it stood there. */
export function HeaderText({ text, label }: { text: string; label: string }) {
  return (
    <pre
      tabIndex={0}
      aria-label={label}
      className="num max-h-96 overflow-auto rounded-control bg-raised p-3 text-sm whitespace-pre-wrap"
    >
      {text}
    </pre>
  );
}
