// A program (WebAssembly) travels gzipped and in base64 inside a plain script
// that sets one global: that is the one way that works from a folder and from a
// host alike.

// compile turns such a text into a WebAssembly.Module. Compiling overlaps
// decompressing.
export function compile(text) {
  const unzipped = new Blob([bytes(text)]).stream().pipeThrough(new DecompressionStream("gzip"));
  return WebAssembly.compileStreaming(new Response(unzipped, { headers: { "Content-Type": "application/wasm" } }));
}

function bytes(text) {
  if (Uint8Array.fromBase64) {
    return Uint8Array.fromBase64(text);
  }
  // A plain loop: the per-character callback of Uint8Array.from takes a second
  // where this takes some milliseconds.
  const characters = atob(text);
  const decoded = new Uint8Array(characters.length);
  for (let i = 0; i < characters.length; i++) {
    decoded[i] = characters.charCodeAt(i);
  }
  return decoded;
}
