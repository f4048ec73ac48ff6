// Package coolward is being built.
package coolward
