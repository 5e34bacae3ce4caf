/** First stop of the keyboard: past the header, to what the page is about. */
export function SkipLink() {
  return (
    <a
      href="#main"
      className="sr-only z-40 bg-ground font-semibold text-act focus:not-sr-only focus:fixed focus:top-2 focus:left-2 focus:px-3 focus:py-2"
    >
      Skip to the content
    </a>
  );
}
