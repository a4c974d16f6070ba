/**
 * From a case file to a {@link org.hullsum.model.Case}: YAML with places, names, units, dimensions,
 * expressions, surfaces; and the JSON Schema of the format.
 *
 * <p>Reading is three layers. {@link org.hullsum.casefile.YamlReader} turns the file into values
 * that know their places, within bounds. {@link org.hullsum.casefile.MapReader} checks the keys of
 * one mapping against {@link org.hullsum.casefile.Section}. One reader per part of the format makes
 * records of it, with {@link org.hullsum.casefile.FormulaReader} for everything that is a number, a
 * quantity or a formula. Nothing is thrown at a user: every problem of a file is collected, with
 * line and column, and all are told together.
 *
 * <p>A name or figure that was refused is treated as known and free of dimension from there on, so
 * that one mistake makes one problem.
 *
 * <p>Imports {@code model} and the floors below. Start reading at {@link
 * org.hullsum.casefile.CaseReader}.
 */
package org.hullsum.casefile;
