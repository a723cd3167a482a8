// In the head, before the first paint: the page takes the theme kept in the cookie. A file, because the content
// security policy lets no inline script run.
(() => {
  const kept = /(?:^|; )theme=(light|dark|system)(?:;|$)/.exec(document.cookie);
  if (kept) document.documentElement.dataset.theme = kept[1];
})();
