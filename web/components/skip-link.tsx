/** The first thing that the Tab key reaches: straight to the page. */
export function SkipLink() {
  return (
    <a
      href="#page"
      className="absolute left-2 z-40 -translate-y-24 bg-ink px-4 py-3 font-semibold text-paper focus:translate-y-2"
      onClick={(event) => {
        event.preventDefault();
        document.getElementById("page")?.focus();
      }}
    >
      Skip to the page
    </a>
  );
}
