import type { ShiftNumbers } from '../steps/shift-page.ts';

/*
 * The shift's numbers, reckoned by hand from the times in the phases beside this file. Times are minutes:seconds since
 * 06:10; hands-on seconds are those of one connector: the seconds since the entry before, shared by the connectors of
 * the entry, at most three times the step's standard time.
 *
 * Who finished when, opened at UPC 0:00, flat 43:00, APC 61:00:
 *
 *   group              n  finished  whole cycle        cure and cool-down                    hands-on
 *   flat, first pass   5  105:00    62:00 = 3,720 s    61-81, 81-91          30:00 = 1,800 s  272
 *   APC, first load   11  128:00    67:00 = 4,020 s    79-99, 99-109         30:00 = 1,800 s  1,307 / 11
 *   UPC, first pass   11   92:00    92:00 = 5,520 s    43-63, 63-73          30:00 = 1,800 s  273.788
 *   UPC 5, scratch     1   95:00    95:00 = 5,700 s    the same              30:00 = 1,800 s  438.333
 *   APC, second load  12  158:00    97:00 = 5,820 s    111-133, 133-143      32:00 = 1,920 s  122
 *   flat 2, crack      1  174:00   131:00 = 7,860 s    30:00 + 115-135-145   60:00 = 3,600 s  845
 *   APC 7, scrapped: not among the passed.             passed: 5 + 11 + 11 + 1 + 12 + 1 = 41
 *
 * Hands-on, by groups of entries:
 *   UPC all: check 10, prepare 30, strip 30, trim 10, clean 15, look 15, mix 15, fill 25, insert 40, crimp 20, tray 5
 *     = 215; cleave 5, air 5; films and clean from the reading at 82:20 to 87:00: 280 / 12 = 23.333
 *     first pass: inspect 10, measure 10, release 60 / 11 = 5.455; in all 273.788
 *     5: inspect 10, film 58, inspect 2, film 43, clean 17, inspect 10, measure 10, release 40; in all 438.333
 *   flat all: check 10, prepare 30, strip 30, trim 10, clean 10, look 10, fill 20, insert 30, crimp 20, tray 10 = 180;
 *     cleave, air, four of films and looking, clean: 7 x 10; inspect 10 = 260
 *     first pass: measure 10, release 10 / 5 = 2; in all 272
 *     2: 260, and anew: prepare 60, six of 30 = 240; cleave after a break of 720 s, but at most 3 x 35 = 105;
 *     six of 30 = 180; inspect 10, measure 10, release 40; in all 845
 *   APC all: check 60 / 24 = 2.5, prepare 10, strip 12, mix 60 / 24 = 2.5 = 27; fill to tray 300 / 12 = 25 = 52;
 *     cleave 5, air 5, films 15 to 1 µm 240 / 12 = 20, final film and clean 60 / 12 = 5 = 87;
 *     inspect, geometry, measure: 3 x 10 = 117
 *     first load: release 20 / 11; 11 of them 11 x 117 + 20 = 1,307
 *     second load: release 60 / 12 = 5; in all 122
 *
 * Sums over the 41: whole cycle 5 x 3,720 + 11 x 4,020 + 11 x 5,520 + 5,700 + 12 x 5,820 + 7,860 = 206,940 s;
 *   hands-on 5 x 272 + 1,307 + (11 x 268.333 + 60) + 438.333 + 12 x 122 + 845 = 8,426 s: average 205.5 s = 3 min
 *   cure 28 x 1,800 + 12 x 1,920 + 3,600 = 77,040 s: average 1,879 s = 31 min
 *   waiting 206,940 - 8,426 - 77,040 = 121,474 s: average 2,963 s = 49 min
 *
 * Of 41 values in order the median is the 21st and the 90th percentile the 37th (R type 7: 1 + 40 x 0.9 = 37):
 *   whole cycle: 5 of 62 min, 11 of 67 (to the 16th), 11 of 92 (to the 27th), 95, 12 of 97 (to the 40th), 131
 *   hands-on: 11 of 118.8 s, 12 of 122 (to the 23rd), 5 of 272, 11 of 273.8 (to the 39th), 438, 845
 *   cure: 28 of 30 min, 12 of 32 (to the 40th), 60
 *   waiting: 5 of 1,648 s, 11 of 2,101 (to the 16th), 3,415, 11 of 3,446 (to the 28th), 3,462, 12 of 3,778
 *
 * Right first time: 42 finished less scratch, crack and scrap = 39 of 42 = 92.9 %. Wilson, 95 %, z = 1.95996:
 *   (39 + 1.9207 -+ 1.95996 sqrt(39 x 3 / 42 + 0.9604)) / (42 + 3.8415) = 0.8099 and 0.9754
 *   scrap, 1 of 42: (1 + 1.9207 -+ 1.95996 sqrt(41 / 42 + 0.9604)) / 45.8415 = 0.0042 and 0.1232
 *
 * Clocks that ended: cures 5 (UPC, flat, APC twice, flat 2), cool-downs 5, films: UPC 5, scratch 2, APC 2 x 5 = 17; 27.
 */
export const reckoned: ShiftNumbers = {
  sentence: '39 of 42 right first time (93 %, 81 to 98); 1 scrapped; most sent back: crack in the glass, 1.',
  figures: {
    Passed: ['41', '41 of 42 that were in work'],
    'Right first time': [/^93\s*%$/, '39 of 42 finished', '95 % sure: 81 to 98 %'],
    Scrapped: ['1', '1 of 42 finished', '95 % sure: 0 to 12 %'],
    'In work': ['0', '0 of 42 that were in work', '0 carried in, 42 started'],
  },
  recipes: {
    '2.5 mm APC 8°, single-mode, by machine, rev A': ['23', '23/24, 96 %', '1', '0', '1 h 37 min'],
    '1.6 mm terminus, flat, multimode, by hand, rev A': ['6', '5/6, 83 %', '0', '0', '62 min'],
    '2.5 mm UPC, single-mode, by machine, rev A': ['12', '11/12, 92 %', '0', '0', '1 h 32 min'],
  },
  cycleSentence: 'Of the 41 that passed, half took 1 h 32 min or less, 9 of 10 took 1 h 37 min or less.',
  averages: { 'hands-on (estimate)': '3 min', 'cure and cool-down': '31 min', waiting: '49 min' },
  cycle: {
    'whole cycle': ['1 h 32 min', '1 h 37 min'],
    'hands-on (estimate)': ['2 min', '4 min'],
    'cure and cool-down': ['30 min', '32 min'],
    waiting: ['57 min', '62 min'],
  },
  clocks: '27 ended; none past the limit, none too early.',
  /** The cure over whose end the tablet slept. */
  lateClock: [/08:23.*WO 4482 · 12 connectors/, '2 min after it was due; alarm seen after 2 min'],
  sentBack: ['Crack in the glass 1', 'Deep single scratch 1'],
  scrapped: ['Broken fibre, no light 1'],
  soFar: 'Shift so far: 41 passed, 2 sent back',
};
