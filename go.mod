module brinefront

go 1.26.0

ignore ./web/node_modules

require (
	github.com/chromedp/cdproto v0.160.1
	github.com/chromedp/chromedp v0.23.1
	github.com/evanw/esbuild v0.28.2
	github.com/maxence-charriere/go-app/v9 v9.8.0
	golang.org/x/net v0.62.0
	gonum.org/v1/gonum v0.17.0
)

require (
	github.com/go-json-experiment/json v0.0.0-20260213210345-44df1a37e875 // indirect
	github.com/google/uuid v1.3.0 // indirect
	golang.org/x/crypto v0.59.0 // indirect
	golang.org/x/sys v0.50.0 // indirect
)
