/* Sets the theme before the first paint. The Floor works the night shift unless the reader chose otherwise. */
(function () {
  const { document, localStorage, location } = globalThis;
  let chosen;
  try {
    chosen = localStorage.getItem("theme");
  } catch {
    chosen = null; // storage is closed to us: the system's theme holds
  }
  const floor = /^\/floor(\/|$)/.test(location.pathname);
  if (chosen === "light" || chosen === "dark") document.documentElement.dataset.theme = chosen;
  else if (floor && chosen !== "system") document.documentElement.dataset.theme = "dark";
})();
