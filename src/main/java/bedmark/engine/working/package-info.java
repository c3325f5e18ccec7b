/**
 * The working behind the numbers of an assessment: each formula in a notation that a person reads and a program can
 * evaluate, with the values that were put in and what came out. Nothing is computed here.
 */
package bedmark.engine.working;
