/** A Greek letter: its sign, its English name, and its LaTeX as an italic quantity symbol. */
export interface GreekLetter {
  readonly sign: string;
  readonly name: string;
  readonly latex: string;
}

const SMALL =
  'α alpha,β beta,γ gamma,δ delta,ε epsilon varepsilon,ζ zeta,η eta,θ theta,ι iota,κ kappa,λ lambda,μ mu,ν nu,ξ xi,ο omicron mathit{o},π pi,ρ rho,σ sigma,τ tau,υ upsilon,φ phi varphi,χ chi,ψ psi,ω omega';
const CAPITAL =
  'Α Alpha mathit{A},Β Beta mathit{B},Γ Gamma varGamma,Δ Delta varDelta,Ε Epsilon mathit{E},Ζ Zeta mathit{Z},Η Eta mathit{H},Θ Theta varTheta,Ι Iota mathit{I},Κ Kappa mathit{K},Λ Lambda varLambda,Μ Mu mathit{M},Ν Nu mathit{N},Ξ Xi varXi,Ο Omicron mathit{O},Π Pi varPi,Ρ Rho mathit{P},Σ Sigma varSigma,Τ Tau mathit{T},Υ Upsilon varUpsilon,Φ Phi varPhi,Χ Chi mathit{X},Ψ Psi varPsi,Ω Omega varOmega';

/** Both alphabets, each in its order. */
export const GREEK_LETTERS: readonly GreekLetter[] = `${SMALL},${CAPITAL}`.split(',').map((entry) => {
  const [sign = '', name = '', latex = name] = entry.split(' ');
  return { sign, name, latex: `\\${latex}` };
});

/** Other signs for the same letter: the micro and ohm signs, and the second forms of some letters. */
const VARIANTS: Readonly<Record<string, string>> = {
  µ: 'μ',
  '\u2126': 'Ω',
  ϑ: 'θ',
  ϕ: 'φ',
  ϵ: 'ε',
  ϱ: 'ρ',
  ς: 'σ',
  ϖ: 'π',
  ϰ: 'κ',
};

const BY_TEXT: ReadonlyMap<string, GreekLetter> = new Map(
  GREEK_LETTERS.flatMap((letter) => [
    [letter.sign, letter],
    [letter.name, letter],
  ]),
);

/**
 * The Greek letter that a text is: its sign, a second form of it, or its English name.
 *
 * @example findGreekLetter('theta')?.sign // => 'θ'
 * @example findGreekLetter('ϕ')?.name // => 'phi'
 * @example findGreekLetter('x') // => null
 */
export function findGreekLetter(text: string): GreekLetter | null {
  return BY_TEXT.get(VARIANTS[text] ?? text) ?? null;
}
