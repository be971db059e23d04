// Alone in its file and without modern syntax, so that an old Node reads it and says what is wrong.
var parts = process.versions.node.split(".").map(Number);
var major = parts[0] || 0;
var minor = parts[1] || 0;

if (major < 20 || (major === 20 && minor < 9)) {
  console.error("Ebbline needs Node 20.9 or newer; this is Node " + process.versions.node + ".");
  process.exit(1);
}
