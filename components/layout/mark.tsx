/** The three stones of the mark. Decoration beside the word: it has no name of its own. */
export function Mark({ className }: { className?: string }) {
  return (
    <svg viewBox="0 0 28 26" width="28" height="26" aria-hidden="true" className={className}>
      <path
        className="fill-stone-2"
        d="M1.2 21.4c.3-2.6 5.4-4.3 12-4.4 7.2-.1 13.4 1.5 13.6 4 .2 2.7-5.9 4.5-13 4.6C6.7 25.7.9 24.2 1.2 21.4Z"
      />
      <path
        className="fill-stone-1"
        d="M4.9 13.3c.1-2.3 4.3-4.1 9.3-4.2 4.9-.1 8.5 1.5 8.5 3.9 0 2.5-3.9 4.3-8.9 4.4-5.1.1-9-1.6-8.9-4.1Z"
      />
      <path
        className="fill-lichen-fill stroke-lichen"
        strokeWidth="1"
        d="M8.9 5.2c.1-2.3 2.7-4 6-4 3.2 0 5.3 1.6 5.2 3.9-.1 2.4-2.7 4.1-5.9 4.1-3.3 0-5.4-1.7-5.3-4Z"
      />
    </svg>
  );
}
