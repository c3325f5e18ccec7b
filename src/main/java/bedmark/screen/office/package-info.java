/** The office's window: packs come in, zones stand worst first, each with its story, the plant's energy, the register. */
package bedmark.screen.office;
