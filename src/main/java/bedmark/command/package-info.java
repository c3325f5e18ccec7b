/** The commands: thin, one class each, with the exit codes that scripts rely on. */
package bedmark.command;
