// Command correlations prints the page of all correlations of the library, made from the correlations
// themselves: ranges, scatter, source, and whether a page was read.
//
//	go run ./examples/correlations > correlations/CORRELATIONS.md
//
// With the name of a body it prints those for that body:
//
//	go run ./examples/correlations -body sphere
package main

import (
	"bufio"
	"flag"
	"fmt"
	"io"
	"os"
	"strings"

	"example.com/coolward/correlations"
)

const usage = `Correlations prints what the library knows about heat transfer from a surface to a fluid, in Markdown.

  -body name   only those for this body, such as "sphere" or "vertical plate"
`

const head = `# Correlations

This page is made from the correlations of the package, with ` + "`go run ./examples/correlations`" + `.

A limit of a range is as precise as its printed digits: 0.7 admits 0.65 to 0.75. The scatter is what a measured
coefficient may differ by, on a smooth surface in an undisturbed stream. "From memory" means that no page was seen that
can be cited: compare it with the publication before anything depends on it. A surface that is calculated to be cool
enough to touch may not be: take the lower end of the scatter, and measure.
`

func main() {
	flag.Usage = func() { fmt.Fprint(flag.CommandLine.Output(), usage) }
	body := flag.String("body", "", "")
	flag.Parse()
	out := bufio.NewWriter(os.Stdout)
	err := page(out, *body)
	if err == nil {
		err = out.Flush()
	}
	if err != nil {
		fmt.Fprintln(os.Stderr, "correlations:", err)
		os.Exit(1)
	}
}

// page writes the page, of one body or of all if body is empty.
func page(w io.Writer, body string) error {
	byBody, bodies := grouped(body)
	if len(bodies) == 0 {
		return fmt.Errorf("no correlation for %q", body)
	}
	var b strings.Builder
	b.WriteString(head)
	all, read := 0, 0
	b.WriteString("\n| body | correlations | read on a page | from memory |\n|---|---|---|---|\n")
	for _, name := range bodies {
		list := byBody[name]
		n := 0
		for _, c := range list {
			if c.Status() == correlations.ReadOnPage {
				n++
			}
		}
		fmt.Fprintf(&b, "| %s | %d | %d | %d |\n", name, len(list), n, len(list)-n)
		all, read = all+len(list), read+n
	}
	fmt.Fprintf(&b, "| all | %d | %d | %d |\n", all, read, all-read)
	for _, name := range bodies {
		fmt.Fprintf(&b, "\n## %s\n", capital(name))
		for _, c := range byBody[name] {
			entry(&b, c)
		}
	}
	_, err := io.WriteString(w, b.String())
	return err
}

// grouped returns the correlations by body, and the bodies in the order of the library.
func grouped(body string) (byBody map[string][]correlations.Correlation, bodies []string) {
	byBody = map[string][]correlations.Correlation{}
	for c := range correlations.All() {
		if body != "" && c.Body() != body {
			continue
		}
		if byBody[c.Body()] == nil {
			bodies = append(bodies, c.Body())
		}
		byBody[c.Body()] = append(byBody[c.Body()], c)
	}
	return byBody, bodies
}

// entry writes one correlation.
func entry(b *strings.Builder, c correlations.Correlation) {
	fmt.Fprintf(b, "\n### %s\n\n", capital(c.Name()))
	for line := range strings.SplitSeq(c.Formula(), "; ") {
		fmt.Fprintf(b, "    %s\n", line)
	}
	var ranges []string
	for r := range c.Ranges() {
		ranges = append(ranges, r.String())
	}
	if ranges == nil {
		ranges = []string{"any flow"}
	}
	fmt.Fprintf(b, "\n- gives: %s, %s\n", c.Kind(), c.Regime())
	fmt.Fprintf(b, "- range: %s\n", strings.Join(ranges, "; "))
	fmt.Fprintf(b, "- length: %s\n- properties at: %s\n", c.Length(), c.Reference())
	fmt.Fprintf(b, "- scatter: ±%.3g %% (%s)\n", 100*c.Scatter().Relative, c.Scatter().Origin)
	fmt.Fprintf(b, "- source: %s\n- status: %s: %s\n", c.Citation(), c.Status(), c.Evidence())
	if c.Note() != "" {
		fmt.Fprintf(b, "- note: %s\n", c.Note())
	}
}

func capital(s string) string {
	return strings.ToUpper(s[:1]) + s[1:]
}
