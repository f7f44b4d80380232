package blochbound.generator;

import blochbound.linalg.SparseMatrix;
import blochbound.model.Monomial;

/**
 * One term of the Bloch generator: a monomial in the parameters times a constant matrix.
 *
 * @param monomial the coefficient mu(p)
 * @param matrix N^2 by N^2 matrix M_kl = tr(B_k L[B_l]); its first row is exactly zero
 * @param radius bound of the Frobenius norm of the error of the matrix
 */
public record GeneratorTerm(Monomial monomial, SparseMatrix matrix, double radius) {}
