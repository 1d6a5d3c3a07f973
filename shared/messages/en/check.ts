/** What is said of the code of a season report. */
export const check = {
  season: 'The report of season {season}, with every entry of the season up to {seq}; first made on {day}.',
  seasonChanged: 'A report of season {season} was made with this code on {day}, and the season’s entries up to {seq} are no longer what they were then. Keep the paper and ask the farm.',
  wentOn: 'Entries were added to the season since. Ask for a newer report to see them.',
  seasonShows: 'It shows that none of those entries was changed, taken out or slipped in since.',
  seasonShowsNot: 'It does not show that what they say is true, that nothing was left out, nor that the work was lawful.',
}
