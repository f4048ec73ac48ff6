package props

import "sync"

const compositionRead = "composition read, freezing point from memory"

// foodRows is the composition of foods.
var foodRows = sync.OnceValue(func() []foodRow {
	return []foodRow{
		{"artichoke", 84.94, 3.27, 0.15, 10.51, 5.4, 1.13, -1.2, read},
		{"asparagus", 92.40, 2.28, 0.20, 4.54, 2.1, 0.57, -0.6, read},
		{"green beans", 90.27, 1.82, 0.12, 7.14, 3.4, 0.66, -0.7, read},
		{"beetroot", 87.58, 1.61, 0.17, 9.56, 2.8, 1.08, -1.1, read},
		{"broccoli", 90.69, 2.98, 0.35, 5.24, 3, 0.92, -0.6, read},
		{"cabbage", 92.15, 1.44, 0.27, 5.43, 2.3, 0.71, -0.9, read},
		{"carrot", 87.79, 1.03, 0.19, 10.14, 3, 0.87, -1.4, read},
		{"cauliflower", 91.91, 1.98, 0.21, 5.20, 2.5, 0.71, -0.8, read},
		{"celery", 94.64, 0.75, 0.14, 3.65, 1.7, 0.82, -0.5, read},
		{"sweet corn", 75.96, 3.22, 1.18, 19.02, 2.7, 0.62, -0.6, read},
		{"cucumber", 96.01, 0.69, 0.13, 2.76, 0.8, 0.41, -0.5, read},
		{"eggplant", 92.03, 1.02, 0.18, 6.07, 2.5, 0.71, -0.8, read},
		{"garlic", 58.58, 6.36, 0.50, 33.07, 2.1, 1.50, -0.8, read},
		{"kale", 84.46, 3.30, 0.70, 10.01, 2, 1.53, -0.5, read},
		{"leek", 83.00, 1.50, 0.30, 14.15, 1.8, 1.05, -0.7, read},
		{"lettuce", 95.89, 1.01, 0.19, 2.09, 1.4, 0.48, -0.2, read},
		{"onion", 89.68, 1.16, 0.16, 8.63, 1.8, 0.37, -0.9, compositionRead},
		{"green peas", 78.86, 5.42, 0.40, 14.46, 5.1, 0.87, -0.6, compositionRead},
		{"potato", 78.96, 2.07, 0.10, 17.98, 1.6, 0.89, -0.6, compositionRead},
		{"tomato", 93.76, 0.85, 0.33, 4.64, 1.1, 0.42, -0.5, compositionRead},
		{"apple", 83.93, 0.19, 0.36, 15.25, 2.7, 0.26, -1.1, recalled},
		{"banana", 74.26, 1.03, 0.48, 23.43, 2.4, 0.80, -0.8, recalled},
		{"orange", 82.30, 1.30, 0.30, 15.50, 4.5, 0.60, -0.8, recalled},
		{"strawberry", 91.57, 0.61, 0.37, 7.02, 2.3, 0.43, -0.8, recalled},
		{"cod", 81.22, 17.81, 0.67, 0, 0, 1.16, -2.2, recalled},
		{"salmon", 76.35, 19.94, 3.45, 0, 0, 1.22, -2.2, recalled},
		{"beef carcass", 57.26, 17.32, 24.05, 0, 0, 0.81, -2.2, recalled},
		{"lean beef round", 70.83, 22.03, 4.89, 0, 0, 1.08, 0, recalled},
		{"lean beef sirloin", 71.70, 21.24, 4.40, 0, 0, 1.08, -1.7, recalled},
	}
})
