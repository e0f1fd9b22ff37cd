/** Seeded randomness as an argument. No model calls Math.random: the same seed gives the same bytes on any machine. */
export interface Random {
  /** Uniform in [0, 1). */
  uniform(): number;
  /** Normal, mean 0, standard deviation 1. */
  normal(): number;
}
