return SpeedCommand.Desk.Commands.DeskProgram.Run(args);
