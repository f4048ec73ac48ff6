package main

import (
	_ "example.com/coolward"
	_ "gonum.org/v1/plot"
)

func main() {}
