/**
 * The plant register, the rounds, and the survey as the fold of what people did. Turns a survey into the engine's
 * loading zone. Knows no file, no clock and no JSON library.
 */
package bedmark.survey;
