package main

import (
	"fmt"
	"os"
	"os/exec"
	"path/filepath"
	"strings"

	"github.com/evanw/esbuild/pkg/api"
)

// The oldest browsers that have what the programs need (DecompressionStream and
// a security policy that tells WebAssembly from eval); boot.js says so to others.
var engines = []api.Engine{
	{Name: api.EngineChrome, Version: "103"},
	{Name: api.EngineFirefox, Version: "113"},
	{Name: api.EngineSafari, Version: "16.4"},
}

// bundle writes the scripts and styles of the site.
func bundle() error {
	runtime, err := wasmExec()
	if err != nil {
		return err
	}
	worker, err := bundleText("worker.js", api.BuildOptions{Engines: engines, Plugins: []api.Plugin{virtual("wasm_exec", runtime)}})
	if err != nil {
		return err
	}
	plugins := []api.Plugin{
		virtual("wasm_exec", runtime),
		virtual("worker-script", fmt.Sprintf("export default %q", worker)),
	}
	for _, entry := range []struct {
		file    string
		options api.BuildOptions
	}{
		{"boot.js", api.BuildOptions{Target: api.ES5}},
		{"start.js", api.BuildOptions{Engines: engines, Plugins: plugins}},
		{"engine.js", api.BuildOptions{Engines: engines, Plugins: plugins}},
		{"plot.js", api.BuildOptions{Engines: engines}},
		{"style.css", api.BuildOptions{Engines: engines}},
		{"print.css", api.BuildOptions{Engines: engines}},
	} {
		text, err := bundleText(entry.file, entry.options)
		if err != nil {
			return err
		}
		if err := writeSite(entry.file, []byte(text)); err != nil {
			return err
		}
	}
	return nil
}

// bundleText makes one file of an entry in web and all it imports.
func bundleText(file string, options api.BuildOptions) (string, error) {
	options.EntryPoints = []string{filepath.Join(webFolder, file)}
	options.Bundle = true
	options.Format = api.FormatIIFE
	options.Charset = api.CharsetUTF8
	options.MinifyWhitespace, options.MinifyIdentifiers, options.MinifySyntax = true, true, true
	options.LegalComments = api.LegalCommentsNone // THIRD-PARTY.txt has them in full
	if strings.HasSuffix(file, ".css") {
		options.Format = api.FormatDefault
	}
	result := api.Build(options)
	if len(result.Errors) > 0 || len(result.Warnings) > 0 {
		said := append(
			api.FormatMessages(result.Errors, api.FormatMessagesOptions{Kind: api.ErrorMessage}),
			api.FormatMessages(result.Warnings, api.FormatMessagesOptions{Kind: api.WarningMessage})...)
		return "", fmt.Errorf("%s cannot be bundled:\n%s", file, strings.Join(said, ""))
	}
	return string(result.OutputFiles[0].Contents), nil
}

// virtual lets scripts import a name that no file has.
func virtual(name, script string) api.Plugin {
	return api.Plugin{Name: name, Setup: func(build api.PluginBuild) {
		build.OnResolve(api.OnResolveOptions{Filter: "^" + name + "$"}, func(api.OnResolveArgs) (api.OnResolveResult, error) {
			return api.OnResolveResult{Path: name, Namespace: name}, nil
		})
		build.OnLoad(api.OnLoadOptions{Filter: ".*", Namespace: name}, func(api.OnLoadArgs) (api.OnLoadResult, error) {
			return api.OnLoadResult{Contents: &script, Loader: api.LoaderJS}, nil
		})
	}}
}

// wasmExec is the script that a Go program needs around it, from the very
// toolchain that compiles the programs.
func wasmExec() (string, error) {
	root, err := exec.Command("go", "env", "GOROOT").Output()
	if err != nil {
		return "", err
	}
	text, err := os.ReadFile(filepath.Join(strings.TrimSpace(string(root)), "lib", "wasm", "wasm_exec.js"))
	return string(text), err
}
