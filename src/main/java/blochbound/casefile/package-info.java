/**
 * Reads case files (YAML 1.2) into {@link blochbound.model.DesignCase}.
 *
 * <p>May import {@code check}, {@code interval}, {@code linalg} and {@code model}; the YAML library
 * stays behind this package.
 *
 * <p>Reading order: {@link blochbound.casefile.CaseReader} is the only entrance. {@code YamlReader}
 * turns text into nodes with positions; {@code SiteReader}, {@code ParameterReader}, {@code
 * BallReader}, {@code DynamicsReader} and {@code RequirementReader} read one section each; {@code
 * Lexer}, {@code ExpressionParser} and {@code Evaluator} read expressions.
 *
 * <p>Invariants: every scalar is text, never a YAML number or boolean; decimals stay exact; every
 * matrix carries a proved error bound; nothing of a case file is ignored; a fault names its place;
 * the work done on one file is limited, however hostile the file.
 */
@NullMarked
package blochbound.casefile;

import org.jspecify.annotations.NullMarked;
