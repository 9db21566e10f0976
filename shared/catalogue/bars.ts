/**
 * Bar sizes by standard: nominal diameter (mm) and area (mm2) as the standard's table gives them, so a rounded area is the
 * table's and not pi d^2 / 4.
 */

export interface BarSize {
  /** As it is called in the trade: `#8`, `D25`, `25`. */
  name: string
  /** mm */
  diameter: number
  /** mm2 */
  area: number
}

export interface BarSeries {
  id: string
  title: string
  /** Where the table was read, or that it is from memory. */
  source: string
  sizes: readonly BarSize[]
}

type Row = readonly [name: string, diameter: number, area: number]

const toSizes = (rows: readonly Row[]): BarSize[] =>
  rows.map(([name, diameter, area]) => ({ name, diameter, area }))

export const barSeries: readonly BarSeries[] = [
  {
    id: 'astm-inch-pound',
    title: 'ASTM A615/A706, inch-pound',
    source:
      'ASTM A615/A706 as tabled by McCormac & Brown, Design of Reinforced Concrete, Table A.2; inches and square inches converted exactly',
    sizes: toSizes([
      ['#3', 9.525, 70.97],
      ['#4', 12.7, 129.03],
      ['#5', 15.875, 200],
      ['#6', 19.05, 283.87],
      ['#7', 22.225, 387.1],
      ['#8', 25.4, 509.68],
      ['#9', 28.651, 645.16],
      ['#10', 32.258, 819.35],
      ['#11', 35.814, 1006.45],
      ['#14', 43.002, 1451.61],
      ['#18', 57.328, 2580.64],
    ]),
  },
  {
    id: 'astm-metric',
    title: 'ASTM A615M/A706M, metric',
    source: 'ASTM A615M/A706M as tabled by McCormac & Brown, Design of Reinforced Concrete, Table B.2',
    sizes: toSizes([
      ['10', 9.5, 71],
      ['13', 12.7, 129],
      ['16', 15.9, 199],
      ['19', 19.1, 284],
      ['22', 22.2, 387],
      ['25', 25.4, 510],
      ['29', 28.7, 645],
      ['32', 32.3, 819],
      ['36', 35.8, 1006],
      ['43', 43, 1452],
      ['57', 57.3, 2581],
    ]),
  },
  {
    id: 'en-10080',
    title: 'EN 10080',
    source: 'EN 10080: nominal area pi d²/4, to four significant digits',
    sizes: toSizes([
      ['6', 6, 28.27],
      ['8', 8, 50.27],
      ['10', 10, 78.54],
      ['12', 12, 113.1],
      ['16', 16, 201.1],
      ['20', 20, 314.2],
      ['25', 25, 490.9],
      ['32', 32, 804.2],
      ['40', 40, 1257],
      ['50', 50, 1963],
    ]),
  },
  {
    id: 'cns-560',
    title: 'CNS 560',
    source: 'CNS 560; D36 and larger from memory',
    sizes: toSizes([
      ['D10', 9.53, 71.33],
      ['D13', 12.7, 126.7],
      ['D16', 15.9, 198.6],
      ['D19', 19.1, 286.5],
      ['D22', 22.2, 387.1],
      ['D25', 25.4, 506.7],
      ['D29', 28.7, 646.9],
      ['D32', 32.2, 814.3],
      ['D36', 35.8, 1007],
      ['D39', 39.4, 1219],
      ['D43', 43, 1452],
      ['D50', 50.2, 1979],
      ['D57', 57.3, 2579],
    ]),
  },
  {
    id: 'jis-g-3112',
    title: 'JIS G 3112',
    source: 'JIS G 3112, from memory',
    sizes: toSizes([
      ['D6', 6.35, 31.67],
      ['D10', 9.53, 71.33],
      ['D13', 12.7, 126.7],
      ['D16', 15.9, 198.6],
      ['D19', 19.1, 286.5],
      ['D22', 22.2, 387.1],
      ['D25', 25.4, 506.7],
      ['D29', 28.6, 642.4],
      ['D32', 31.8, 794.2],
      ['D35', 34.9, 956.6],
      ['D38', 38.1, 1140],
      ['D41', 41.3, 1340],
      ['D51', 50.8, 2027],
    ]),
  },
]
