// Runs before the first paint, so that night never flashes white. Sun is the default, whatever the system prefers.
try {
  if (localStorage.getItem('lockwire.theme') === 'night') document.documentElement.dataset.theme = 'night'
  if (localStorage.getItem('lockwire.glove') === 'on') document.documentElement.dataset.glove = ''
} catch (error) {
  // A browser that keeps nothing for us: the page stays in sun.
  console.info(error)
}
