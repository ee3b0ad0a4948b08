// Starts Shimlore with all it needs on this machine. Nothing is imported before the version of Node.js is known to do:
// an older one would stop at a syntax it does not know, with a message that helps nobody.
const [major, minor] = process.versions.node.split('.').map(Number);
if (major < 20 || (major === 20 && minor < 19)) {
  console.error(`Shimlore needs Node.js 20.19 or newer; this is ${process.versions.node}.`);
  process.exit(1);
}
const { launch } = await import('./start/launch.mjs');
process.exitCode = await launch(process.env, { compiled: true });
