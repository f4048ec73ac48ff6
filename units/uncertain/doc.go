// Package uncertain xx
package uncertain
