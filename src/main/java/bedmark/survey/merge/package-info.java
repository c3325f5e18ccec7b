/**
 * What many tablets brought, as one: pure functions over copies of surveys. The outcome does not depend on the order
 * or the number of times in which copies came.
 */
package bedmark.survey.merge;
