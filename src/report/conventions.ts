/** A convention that every number of the site follows. */
export interface Convention {
  readonly id: string
  readonly title: string
  readonly text: string
}

export const conventions: readonly Convention[] = [
  {
    id: 'spectra',
    title: 'Spectra are one-sided',
    text: 'A power spectral density $S(f)$ is given for $f>0$ only and integrates over hertz to the variance; it is twice the symmetrised two-sided density, $S(f)=2\\bar S(\\omega)$. Curves and tables show the amplitude density $\\sqrt S$.',
  },
  {
    id: 'fourier',
    title: 'Sign of the Fourier transform',
    text: '$x(\\omega)=\\int x(t)\\,e^{+i\\omega t}\\,dt$, so that a time derivative is $-i\\omega$ and a damped response has its loss in the negative imaginary part of $\\chi^{-1}$.',
  },
  {
    id: 'hertz',
    title: 'Hertz means cycles',
    text: 'A rate written in Hz is a rate over $2\\pi$; a rate written in rad/s or s⁻¹ is angular. Linewidths are full widths of the energy response.',
  },
  {
    id: 'decibels',
    title: 'Margins and shares are ratios of powers',
    text: 'A margin is $10\\log_{10}$ of the ratio of two power densities; below the limit it is negative. Shares are parts of the total power; a correlation can be negative, and all shares add up to one.',
  },
  {
    id: 'half-power',
    title: 'Half-power band',
    text: 'The frequencies around the best one at which the total power density is at most twice its least value, so that the amplitude density is at most $\\sqrt2$ times the best.',
  },
  {
    id: 'quanta',
    title: 'Baths are quantum',
    text: 'A bath at temperature $T$ holds $n=1/(e^{\\hbar\\omega/k_BT}-1)$ quanta and drives its mode in proportion to $n+\\tfrac12$. Added noise of an amplifier is in quanta at its own input, where the vacuum is $\\tfrac12$.',
  },
  {
    id: 'detuning',
    title: 'Detuning and angles',
    text: '$\\Delta$ is the pump frequency minus the cavity frequency at the working point, static shift included. A homodyne angle counts from the mean carrier that leaves the port: 0° is its amplitude, 90° its phase. The squeezed quadrature counts from the carrier that enters.',
  },
  {
    id: 'added',
    title: 'Added noise',
    text: 'The noise of the readout alone: ports of the field, losses, amplifiers and the detector, with their back-action and correlations. Baths of the mechanics, ground motion and stray forces do not belong to it.',
  },
  {
    id: 'uncertainty',
    title: 'Uncertainties',
    text: 'A number in brackets is the standard uncertainty in units of the last digits: 3.1(2) ng is 3.1 ng with a standard uncertainty of 0.2 ng. Results carry theirs by the law of propagation of the GUM (JCGM 100:2008, 5.1 and 5.2) to first order; statistical and systematic causes are added up apart. A number that no uncertain value reaches has none. A frequency stands still while values change, except within thirty half widths of a resonance whose place is uncertain by more than its width (in the shaded band, within ten standard uncertainties of it): there a frequency means the distance from the resonance.',
  },
]
