/**
 * Results as text for engineers and as JSON for programs.
 *
 * <p>Imports everything up to study. Read {@link blochbound.report.CertifyText} and {@link
 * blochbound.report.CertifyJson} first, then {@link blochbound.report.CaseText}; {@code NumberText}
 * and {@code BracketDigits} decide how numbers are rounded, {@code TextTable} and {@code
 * TextLayout} how lines are laid out.
 *
 * <p>Invariants: a guaranteed value is never rounded to the unsafe side; limits and points are
 * written exactly; no text line is longer than {@value blochbound.report.TextLayout#WIDTH} columns;
 * the same record gives the same text on every machine; the JSON library stays behind this package.
 */
@NullMarked
package blochbound.report;

import org.jspecify.annotations.NullMarked;
