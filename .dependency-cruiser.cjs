const rule = (name, from, to, comment) => ({ name, severity: 'error', comment, from, to })

/** Who may import whom; DEVELOPERS.md says why. */
module.exports = {
  forbidden: [
    rule('no-circles', {}, { circular: true }, 'A circle hides which of two things comes first.'),
    rule('shared-is-pure', { path: '^shared/' }, { path: '^(src|server|migrations|tests)/' }, 'shared/ knows neither side.'),
    rule('shared-has-no-node', { path: '^shared/' }, { dependencyTypes: ['core'] }, 'shared/ runs in the browser too.'),
    rule('sides-never-meet', { path: '^src/' }, { path: '^(server|migrations)/' }, 'The client knows the server by its contract.'),
    rule('server-knows-no-client', { path: '^server/' }, { path: '^src/' }),
    rule('routes-call-services', { path: '^server/routes/' }, { path: '^server/(database/(?!actor)|entities|jobs)/' }, 'A route parses, calls one service and answers.'),
    rule('services-know-no-web', { path: '^server/services/' }, { path: '^(server/(routes|middleware)/|node_modules/(express|passport))' }),
    rule('reports-query-nothing', { path: '^server/reports/' }, { path: '^server/(database|entities|services|routes|middleware)/' }),
    rule('entities-stand-alone', { path: '^server/entities/' }, { path: '^server/(?!entities/)' }),
    rule('history-stands-still', { path: '^migrations/' }, { path: '^(server|shared|src)/' }, 'A migration must not move when the code does.'),
    rule('one-door-to-the-data', { path: '^(server/(?!database/)|src/)' }, { path: '^server/database/(dataSource|entities)\\.ts$' }, 'Use inFarm or inHouse.'),
    rule('components-get-props', { path: '^src/components/' }, { path: '^src/(stores|api|router|views)/' }),
    rule('views-use-composables', { path: '^src/views/' }, { path: '^src/api/' }),
    rule('nobody-imports-views', { path: '^src/(?!App\\.vue$|router/|views/)' }, { path: '^src/views/' }),
    rule('api-is-lowest', { path: '^src/api/' }, { path: '^src/(stores|composables|components|views|router)/' }),
    rule('composables-know-no-components', { path: '^src/composables/' }, { path: '^src/(components/.*\\.vue$|views/)' }, 'A composable may know the shape of what a part takes, never the part.'),
    rule('nobody-imports-tests', { path: '^(src|server|shared|migrations)/' }, { path: '^tests/' }),
  ],
  options: {
    doNotFollow: { path: 'node_modules' },
    tsPreCompilationDeps: true,
    tsConfig: { fileName: 'tsconfig.json' },
    enhancedResolveOptions: { exportsFields: ['exports'], conditionNames: ['import', 'default'], extensions: ['.ts', '.vue', '.js', '.mjs'] },
  },
}
