/** The sign of an error; words always stand beside it. */
export function Triangle({ className }: { readonly className?: string }) {
  return (
    <svg
      width="16"
      height="16"
      viewBox="0 0 16 16"
      fill="none"
      stroke="currentColor"
      strokeWidth="1.5"
      strokeLinecap="round"
      strokeLinejoin="round"
      aria-hidden="true"
      className={className}
    >
      <path d="M8 4.6v4.2M8 11.2v.2M8 1.8l6.6 11.8H1.4z" />
    </svg>
  );
}
