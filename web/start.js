// start.js starts the interface: it compiles the program and gives it the few
// globals that go-app looks for.
import "wasm_exec";
import { compile } from "./programs.js";

// What go-app calls. It is served by no server and installed by no browser, so
// most of it has nothing to do.
self.goappGetenv = () => ""; // no prefix, no server's settings
self.goappNav = () => {}; // replaced by the program, as the next two
self.goappOnUpdate = () => {};
self.goappOnAppInstallChange = () => {};
self.goappIsAppInstallable = () => false;
self.goappIsAppInstalled = () => false;

// A sheet of paper says which day it is of.
addEventListener("beforeprint", () => {
  const day = document.getElementById("printed");
  if (day) day.textContent = new Date().toLocaleDateString("sv"); // year, month, day
});

const boot = self.brinefrontBoot;
const compiled = compile(self.brinefrontInterfaceProgram);
delete self.brinefrontInterfaceProgram; // megabytes of text that nobody reads again

// The program may ask for the engine and for pictures at once, so it starts when
// every file has been run or is known to be missing.
const loaded = new Promise((resolve) => addEventListener("load", resolve));

async function start() {
  const module = await compiled;
  boot.reached("Starting the engine");
  await loaded;
  await self.brinefrontEngine.ready;
  if (boot.stopped()) return;
  boot.reached("Opening the bench");
  const go = new Go();
  const instance = await WebAssembly.instantiate(module, go.importObject);
  const ended = go.run(instance);
  boot.reached("Open");
  await ended;
  boot.stop("The program has stopped by a fault of its own. What you typed is kept in this browser: reload the page to go on. Please send us the text of the browser's console.");
}

start().catch((fault) => {
  console.error(fault);
  boot.stop(`The program could not be started: ${fault.message}. Reload the page; if it stays so, copy the whole folder again.`);
});
