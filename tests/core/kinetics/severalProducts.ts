/**
 * Two histories of several products at once, invented, with references worked out outside this project by superposition in
 * 60-digit arithmetic (mpmath 1.3.0), printed to 20 digits: levels, and over [from, to] the area, the peak (root of the
 * derivative) and the lowest level (least of the ends and of the starts of absorption).
 */
export const SEVERAL_PRODUCTS = [
  {
    name: "immediate and slow release together",
    ke: 0.086,
    volume: 31.5,
    courses: [
      {
        ka: 1.3,
        bioavailability: 0.95,
        lag: 0.25,
        doses: [
          { time: 0, amount: 200 },
          { time: 12.5, amount: 150 },
          { time: 24, amount: 200 },
        ],
      },
      {
        ka: 0.045,
        bioavailability: 0.8,
        lag: 1.5,
        doses: [
          { time: 2, amount: 400 },
          { time: 26, amount: 400 },
        ],
      },
    ],
    times: [0.2, 0.25, 1, 3.75, 12.5, 13, 25.1, 30, 55, 140],
    levels: [
      0.0, 0.0, 3.6192805860889234, 4.824365122838859, 4.547131702088222, 5.744406168540531, 8.779743827116798,
      8.747108364043735, 3.7977485135473854, 0.09418417819447081,
    ],
    from: 3,
    to: 40,
    auc: 251.6314357881505,
    peak: 9.599471801169289,
    timeOfPeak: 26.15307093911614,
    lowest: 4.525400249624411,
    timeOfLowest: 12.75,
  },
  {
    name: "one product equal to elimination, one near it, one far",
    ke: 0.25,
    volume: 18,
    courses: [
      {
        ka: 0.25,
        bioavailability: 1,
        lag: 0,
        doses: [
          { time: -6, amount: 80 },
          { time: 6, amount: 80 },
        ],
      },
      {
        ka: 0.2500000000001,
        bioavailability: 0.6,
        lag: 0,
        doses: [
          { time: 0, amount: 50 },
          { time: 6, amount: 50 },
        ],
      },
      { ka: 9, bioavailability: 0.9, lag: 0.7, doses: [{ time: 1, amount: 30 }] },
    ],
    times: [-6, -5.9, 0, 1.7, 1.75, 3, 6, 7.5, 12, 60],
    levels: [
      0.0, 0.1083677680031477, 1.4875344009895322, 1.7111350731259551, 2.2512558748523475, 2.7591941288432653,
      1.7482266582165635, 2.9294524211157618, 2.6339695434254917, 0.00012647903608582897,
    ],
    from: -2,
    to: 9,
    auc: 24.719941572515758,
    peak: 3.2011427770181236,
    timeOfPeak: 8.95694743237925,
    lowest: 1.4875344009895322,
    timeOfLowest: 0.0,
  },
] as const;
