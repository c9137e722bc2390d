// engine.js starts the engine: the program that computes, in web workers. The
// interface uses it, and so can any other page that loads this one file from the
// folder (it finds engine-program.js beside it):
//
//   <script src="brinefront/engine.js"></script>
//   const result = await brinefront.run(study, request);
//
// brinefront.run(study, request) takes a study as an object, as the file that
// Save writes (see study.schema.json), computes it and resolves to the result as
// an object, in SI. request is optional; {kind: "run"} is its default and the
// other kinds are those of app/wire. It rejects when the engine fails, which is a
// bug of ours; a study that cannot be used is no failure: the result lists its
// problems.
//
// brinefrontEngine.start(onReply, onDead) starts a worker and returns
// {post(text), stop()}. Texts are requests and replies as app/wire has them.
// onDead(reason) is called once when the worker cannot start or stops by itself.
//
// A page with a content security policy has to allow 'wasm-unsafe-eval' for
// scripts and blob: for workers.
import workerScript from "worker-script";
import { compile } from "./programs.js";

const folder = new URL(".", document.currentScript.src).href;

// One compilation for all workers. It begins at once, beside everything else the
// page is doing.
const compiled = program().then((text) => {
  delete self.brinefrontEngineProgram;
  return compile(text);
});

// A page that was never asked to compute must not report a rejection of its own;
// whoever asks is told.
compiled.catch(() => {});

function program() {
  if (self.brinefrontEngineProgram) {
    return Promise.resolve(self.brinefrontEngineProgram);
  }
  return new Promise((resolve, reject) => {
    const script = document.createElement("script");
    script.src = folder + "engine-program.js";
    script.onload = () => resolve(self.brinefrontEngineProgram);
    script.onerror = () => reject(new Error("the file engine-program.js did not load"));
    document.head.appendChild(script);
  });
}

// Blob, because a worker may not be made from a file of a folder.
const workerAddress = URL.createObjectURL(new Blob([workerScript], { type: "text/javascript" }));

function start(onReply, onDead) {
  const waiting = []; // posted before there is a worker
  let worker = null;
  let over = false;

  const die = (reason) => {
    if (over) return;
    over = true;
    worker?.terminate();
    onDead(reason);
  };

  compiled.then((module) => {
    if (over) return;
    worker = new Worker(workerAddress);
    worker.onmessage = ({ data }) => (typeof data === "string" ? onReply(data) : die(data.dead));
    worker.onerror = (event) => die(`The engine stopped: ${event.message}`);
    worker.postMessage(module);
    waiting.splice(0).forEach((text) => worker.postMessage(text));
  }).catch((fault) => die(`The engine could not be started: ${fault.message}.`));

  return {
    post(text) {
      if (over) return;
      worker ? worker.postMessage(text) : waiting.push(text);
    },
    stop() {
      over = true;
      worker?.terminate();
    },
  };
}

// ready resolves when a worker can be started without waiting.
self.brinefrontEngine = { start, ready: compiled };

let shared = null; // the worker of brinefront.run
const asked = new Map();
let last = 0;

function answer(text) {
  const reply = JSON.parse(text);
  const { resolve, reject } = asked.get(reply.id);
  asked.delete(reply.id);
  reply.failure ? reject(new Error(reply.failure)) : resolve(reply.result ?? reply.checks);
}

function giveUp(reason) {
  shared = null; // the next request starts a new worker
  for (const { reject } of asked.values()) reject(new Error(reason));
  asked.clear();
}

self.brinefront = {
  run(study, request = { kind: "run" }) {
    shared ??= start(answer, giveUp);
    const id = ++last;
    return new Promise((resolve, reject) => {
      asked.set(id, { resolve, reject });
      shared.post(JSON.stringify({ ...request, id, study }));
    });
  },
};
