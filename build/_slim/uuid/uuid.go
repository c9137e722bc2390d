// Package uuid stands in for github.com/google/uuid in the interface program:
// go-app wants of it only that two pages of one browser have different names.
// The original draws from crypto/rand and brings a module of ciphers along.
package uuid

import (
	"math/rand/v2"
	"strconv"
)

// NewString returns 128 random bits in hexadecimal figures.
func NewString() string {
	return strconv.FormatUint(rand.Uint64(), 16) + "-" + strconv.FormatUint(rand.Uint64(), 16)
}
