using SpeedCommand.Commands;

return await CommandTree.Build().InvokeAsync(args).ConfigureAwait(false);
