/* On paper nothing can be unfolded: what is folded opens for the print and closes after it. */
let opened: HTMLDetailsElement[] = [];

window.addEventListener('beforeprint', () => {
  opened = [...document.querySelectorAll<HTMLDetailsElement>('.sec details:not([open]):not(.no-print)')];
  for (const one of opened) one.open = true;
});
window.addEventListener('afterprint', () => {
  for (const one of opened) one.open = false;
});
