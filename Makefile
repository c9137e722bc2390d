# Brinefront: what a developer runs. Each target does its own set-up.

SHELL := /bin/bash
.SHELLFLAGS := -eu -o pipefail -c

ROOMS := ./app/... ./build/... ./physics/...
WASM := GOOS=js GOARCH=wasm
# go test runs WebAssembly by a program of the toolchain, on Node.
ON_NODE = PATH="$$(go env GOROOT)/lib/wasm:$$PATH" $(WASM)
# npm leaves this file when it has installed what the lock file says.
INSTALLED := web/node_modules/.package-lock.json
# The packages that keep golden files, and so know the flag -update.
KEEPERS = $(sort $(dir $(wildcard app/*/golden_test.go physics/*/golden_test.go)))

.PHONY: run test site usb bench golden tools chromium

# The site, served on this machine only; PORT=8000 asks for a port.
run: site
	go run ./build serve $(PORT)

site: $(INSTALLED)
	go run ./build site
	go run ./build check

usb: site
	go run ./build usb

# Everything that is checked.
test: site chromium
	@unformatted="$$(gofmt -l app build physics)"; if [ -n "$$unformatted" ]; then echo "not formatted (run gofmt -w):" $$unformatted; exit 1; fi
	go vet $(ROOMS)
	$(WASM) go vet ./app/... ./physics/...
	@echo "In WebAssembly, on Node:"
	$(ON_NODE) go test -short ./physics/... ./app/engine/...
	@echo "Native, and the pages in Chromium:"
	go test -timeout 20m $(ROOMS)

bench: site chromium
	go run ./build bench

# Rewrites the stored results and prints what changed.
golden: tools
	go test $(addprefix ./,$(KEEPERS)) -args -update
	git --no-pager diff -- testdata/golden

tools:
	@command -v go >/dev/null || { echo "Go is missing: install Go 1.26 or newer."; exit 1; }
	@command -v node >/dev/null && command -v npm >/dev/null || { echo "Node is missing: install Node 20 or newer with npm (apt-get install nodejs npm)."; exit 1; }

$(INSTALLED): web/package-lock.json web/package.json | tools
	cd web && npm ci --no-audit --no-fund
	@touch $@

chromium: tools
	@go run ./build chromium
