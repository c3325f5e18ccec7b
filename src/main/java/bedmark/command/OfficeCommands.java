package bedmark.command;

import picocli.CommandLine;

/** The commands of the office, each on an office store. */
final class OfficeCommands {
    private OfficeCommands() {
    }

    static CommandLine line(Surroundings surroundings) {
        return new CommandLine(new Group.OfficeGroup())
                .addSubcommand(new OfficeNameCommand(surroundings))
                .addSubcommand(new OfficeReceiveCommand(surroundings))
                .addSubcommand(new OfficeRefusedCommand(surroundings))
                .addSubcommand(new OfficeRankCommand(surroundings))
                .addSubcommand(new OfficeTrendCommand(surroundings))
                .addSubcommand(new OfficeEnergyCommand(surroundings))
                .addSubcommand(new OfficeAcceptCommand(surroundings))
                .addSubcommand(new OfficeActionCommand(surroundings))
                .addSubcommand(new OfficeSettleCommand(surroundings))
                .addSubcommand(new OfficeExportCommand(surroundings))
                .addSubcommand(new OfficeImportRegisterCommand(surroundings))
                .addSubcommand(new OfficeExportRegisterCommand(surroundings))
                .addSubcommand(new OfficeRoundCommand(surroundings))
                .addSubcommand(new OfficeReportCommand(surroundings))
                .addSubcommand(new OfficeCheckCommand(surroundings))
                .addSubcommand(new OfficeRebuildCommand(surroundings));
    }
}
