using System.CommandLine;
using SpeedCommand.Desk.Commands;

var root = new RootCommand("SpeedCommand at the desk: simulates flights. Advisory only; not a flight instrument.")
{
    SimulateCommand.Create(),
};
return DeskProgram.Run(root, args);
