/** The first stop of the Tab key: past the top line, to the page. */
export function SkipLink() {
  return (
    <a
      href="#page"
      onClick={(event) => {
        event.preventDefault();
        document.getElementById('page')?.focus();
      }}
      className="sr-only z-30 rounded-md bg-ink px-4 py-2 text-sm text-on-ink focus:not-sr-only focus:fixed focus:top-2 focus:left-2"
    >
      Go to the page
    </a>
  );
}
