/** One published source that an equation of the catalogue rests on. */
export interface Reference {
  readonly authors: string
  readonly where: string
  readonly year: number
}

export const references = {
  'callen-welton-1951': { authors: 'H. B. Callen, T. A. Welton', where: 'Phys. Rev. 83, 34', year: 1951 },
  'saulson-1990': { authors: 'P. R. Saulson', where: 'Phys. Rev. D 42, 2437', year: 1990 },
  'clerk-2010': {
    authors: 'A. A. Clerk, M. H. Devoret, S. M. Girvin, F. Marquardt, R. J. Schoelkopf',
    where: 'Rev. Mod. Phys. 82, 1155',
    year: 2010,
  },
  'aspelmeyer-2014': {
    authors: 'M. Aspelmeyer, T. J. Kippenberg, F. Marquardt',
    where: 'Rev. Mod. Phys. 86, 1391',
    year: 2014,
  },
  'kimble-2001': {
    authors: 'H. J. Kimble, Y. Levin, A. B. Matsko, K. S. Thorne, S. P. Vyatchanin',
    where: 'Phys. Rev. D 65, 022002',
    year: 2001,
  },
  'caves-1981': { authors: 'C. M. Caves', where: 'Phys. Rev. D 23, 1693', year: 1981 },
  'putman-1992': {
    authors: 'C. A. J. Putman, B. G. de Grooth, N. F. van Hulst, J. Greve',
    where: 'J. Appl. Phys. 72, 6',
    year: 1992,
  },
  'hsu-2004': {
    authors: 'M. T. L. Hsu, V. Delaubert, P. K. Lam, W. P. Bowen',
    where: 'J. Opt. B: Quantum Semiclass. Opt. 6, 495',
    year: 2004,
  },
  'caves-1982': { authors: 'C. M. Caves', where: 'Phys. Rev. D 26, 1817', year: 1982 },
  'friis-1944': { authors: 'H. T. Friis', where: 'Proc. IRE 32, 419', year: 1944 },
  'braginsky-khalili-1992': {
    authors: 'V. B. Braginsky, F. Ya. Khalili',
    where: 'Quantum Measurement (Cambridge University Press)',
    year: 1992,
  },
  'tsang-2011': { authors: 'M. Tsang, H. M. Wiseman, C. M. Caves', where: 'Phys. Rev. Lett. 106, 090401', year: 2011 },
} as const satisfies { readonly [key: string]: Reference }

export type ReferenceKey = keyof typeof references
