namespace SpeedCommand.Desk.Cards;

/// <summary>A number on a card, ready to print, and the sign of the limit that holds it; a blank where none does.</summary>
internal readonly record struct CardCell(string Text, char Sign = ' ');
