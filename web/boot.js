// boot.js is read first, by every browser there is: it keeps to the oldest
// script syntax, so that a browser too old for the rest can still say so. It
// looks what the browser can do, loads the other files of the folder, shows how
// far the start has come, and says in a sentence what went wrong. It computes
// nothing and knows nothing of what it starts.
//
// The programs travel in scripts because a page opened from a folder may not
// fetch; see programs.js for how they get out of them.
(function () {
  var root = document.documentElement;

  // In the order in which they run; they are downloaded side by side.
  var files = ["interface-program.js", "start.js", "engine-program.js", "engine.js", "plot.js"];

  // What the start is made of. Each step is worth the same on the bar: none is
  // timed, and the bar says what is done, not what it guesses.
  var steps = files.length + 3;
  var done = 0;
  var step = "Reading the files of this folder";
  var fault = "";

  function show() {
    root.className = fault ? "stopped" : "starting";
    var bar = document.getElementById("start-bar");
    if (!bar) {
      return; // the page is still being read, or the program has taken over
    }
    bar.value = done / steps;
    document.getElementById("start-step").firstChild.nodeValue = step;
    var sentence = document.getElementById("start-fault");
    if (fault && !sentence.firstChild) {
      sentence.appendChild(document.createTextNode(fault));
    }
  }

  // stop says why the page cannot go on. Only the first reason counts: others
  // follow from it.
  function stop(reason) {
    if (fault) {
      return;
    }
    fault = reason;
    show();
    if (!document.getElementById("start-fault") && document.body) {
      // The program had taken over the page: what it shows stays readable below.
      var sentence = document.createElement("p");
      sentence.id = "start-fault";
      sentence.setAttribute("role", "alert");
      sentence.style.cssText = "display: block; margin: 0; padding: .75rem 1rem; font: 1rem/1.5 system-ui, sans-serif; color: #fff; background: #8a2c20";
      sentence.appendChild(document.createTextNode(fault));
      document.body.appendChild(sentence);
      sentence.scrollIntoView();
    }
  }

  function missing(file) {
    stop("The file " + file + " of this folder did not load. Copy the whole folder again and reload the page.");
  }

  // what is absent in this browser that the programs cannot do without.
  function absent() {
    var needs = ["WebAssembly", "DecompressionStream", "Response", "Worker", "Blob", "URL", "Promise", "TextDecoder", "crypto", "BigInt"];
    for (var i = 0; i < needs.length; i++) {
      if (typeof self[needs[i]] === "undefined") {
        return needs[i];
      }
    }
    return "";
  }

  // Files that do not load report to the element that asked for them, and not
  // further up; a listener that captures hears of them all.
  window.addEventListener("error", function (event) {
    var element = event.target;
    var address = element && (element.src || element.href);
    if (address) {
      missing(address.slice(address.lastIndexOf("/") + 1));
    }
  }, true);

  document.addEventListener("DOMContentLoaded", show);

  var lacking = absent();
  if (lacking) {
    stop("This browser is too old to compute here (it has no " + lacking + "). Use Chromium, Chrome or Edge from version 103, Firefox from 113 or Safari from 16.4.");
    return;
  }

  // For the scripts that go on from here; nobody else needs it.
  self.brinefrontBoot = {
    // reached tells that one more step is done, and what comes next.
    reached: function (next) {
      done++;
      step = next;
      show();
    },
    stop: stop,
    // stopped tells whether something is wrong: nothing may start any more.
    stopped: function () { return fault !== ""; }
  };

  show();
  files.forEach(function (file) {
    var script = document.createElement("script");
    script.src = file;
    script.async = false; // run in order
    script.onload = function () { self.brinefrontBoot.reached(step); };
    document.head.appendChild(script);
  });
})();
