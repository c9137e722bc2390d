// worker.js is the first thing that runs in a worker: it receives the compiled
// program, starts it, and hands it every text that comes after. Texts go out as
// they are; an object {dead: reason} says that the program has ended.
import "wasm_exec";

self.onmessage = async ({ data: module }) => {
  const waiting = []; // what comes before the program listens
  self.onmessage = ({ data }) => waiting.push(data);

  // The program calls this once, with the function that serves a text.
  self.brinefrontListen = (serve) => {
    const reply = (text) => self.postMessage(text);
    self.onmessage = ({ data }) => serve(data, reply);
    waiting.forEach((text) => serve(text, reply));
  };

  try {
    const go = new Go();
    await go.run(await WebAssembly.instantiate(module, go.importObject));
    self.postMessage({ dead: "The engine stopped by a fault of its own; the browser's console has its text." });
  } catch (fault) {
    self.postMessage({ dead: `The engine could not go on: ${fault.message}.` });
  }
};
