// Before anything else, in words that a Node of any age understands.
var parts = process.versions.node.split('.').map(Number);

if (parts[0] < 20 || (parts[0] === 20 && parts[1] < 19)) {
  console.error('Antiphon needs Node 20.19 or newer; this is ' + process.versions.node + '.');
  process.exit(1);
}
