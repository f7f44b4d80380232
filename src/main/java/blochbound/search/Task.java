package blochbound.search;

import java.util.function.Consumer;

/**
 * One independent run.
 *
 * @param start where it begins
 * @param method what it does with its own evaluator
 */
record Task(SearchStart start, Consumer<Evaluator> method) {}
