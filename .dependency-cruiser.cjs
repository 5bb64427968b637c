/** The rooms and what may import what. Type imports count (tsPreCompilationDeps). */
const room = (name, from, to, comment) => ({ name, severity: 'error', comment, from, to });
module.exports = {
  forbidden: [
    room(
      'no-circular',
      {},
      { circular: true },
      'Two files that need each other are one file or need a third.',
    ),
    room('no-unresolvable', {}, { couldNotResolve: true }, 'An import that leads nowhere.'),
    room(
      'shared-knows-the-trade-only',
      { path: '^shared/', pathNot: '\\.test\\.ts$|^shared/evaluate/cli' },
      { path: '^(src|server)/' },
      'shared/ runs in browser and Node.',
    ),
    room(
      'shared-is-pure',
      {
        path: '^shared/',
        pathNot: '\\.test\\.ts$|^shared/contracts/|^shared/evaluate/|^shared/plots/',
      },
      { dependencyTypes: ['npm', 'npm-dev', 'core'], pathNot: 'node_modules/@types' },
      'Only shared/contracts (zod) and shared/plots (d3) may use a package.',
    ),
    room(
      'only-contracts-use-zod',
      { path: '^shared/', pathNot: '^shared/contracts/|\\.test\\.ts$' },
      { path: 'node_modules/zod' },
      'zod lives in shared/contracts.',
    ),
    room(
      'geometry-and-timing-import-nothing',
      { path: '^shared/(geometry|timing)/', pathNot: '\\.test\\.ts$' },
      { path: '^shared/', pathNot: '^shared/$1/' },
      'geometry and timing stand at the bottom.',
    ),
    room(
      'measures-below-course',
      { path: '^shared/(landmarks|measures)/', pathNot: '\\.test\\.ts$' },
      { path: '^shared/(course|reading|overlay|contracts|access)/' },
      'Data travels one way: marks, lift and turn, course, reading.',
    ),
    room(
      'course-below-reading',
      { path: '^shared/course/', pathNot: '\\.test\\.ts$' },
      { path: '^shared/(reading|overlay|contracts|access)/' },
      'Data travels one way.',
    ),
    room(
      'src-never-imports-server',
      { path: '^src/' },
      { path: '^server/' },
      'The browser speaks to the server through shared/contracts.',
    ),
    room(
      'server-never-imports-src',
      { path: '^server/' },
      { path: '^src/' },
      'The server knows nothing of the pages.',
    ),
    room(
      'features-are-islands',
      { path: '^src/features/([^/]+)/' },
      { path: '^src/features/([^/]+)/', pathNot: '^src/features/$1/' },
      'src/app composes the features.',
    ),
    room(
      'features-do-not-import-app',
      { path: '^src/(features|ui|canvas|video|tracking|api)/' },
      { path: '^src/app/' },
      'app stands on top.',
    ),
    room(
      'canvas-and-ui-fetch-nothing',
      { path: '^src/(canvas|ui)/' },
      { path: '^src/(api|features)/|node_modules/@tanstack/react-query' },
      'canvas and ui get data as props.',
    ),
    room(
      'video-without-react',
      { path: '^src/video/' },
      { path: 'node_modules/(react|react-dom)/|^src/(api|features|ui|canvas)/' },
      'The decoder is plain TypeScript.',
    ),
    room(
      'tracking-without-react',
      { path: '^src/tracking/' },
      { path: 'node_modules/(react|react-dom)/|^src/(api|features|ui|canvas)/' },
      'Following marks is plain TypeScript.',
    ),
    room(
      'tracking-core-is-pure',
      { path: '^src/tracking/core/', pathNot: '\\.test\\.ts$' },
      { pathNot: '^src/tracking/(core/|types\\.ts$)|^shared/(geometry|timing)/' },
      'What follows a mark knows pixels and frames, neither page nor decoder.',
    ),
    room(
      'video-below-tracking',
      { path: '^src/video/' },
      { path: '^src/tracking/' },
      'Marks follow on pictures, never the reverse.',
    ),
    room(
      'child-processes-in-media',
      { path: '^server/', pathNot: '^server/media/|\\.test\\.ts$' },
      { path: '^(node:)?child_process$|node_modules/fluent-ffmpeg' },
      'server/media is the only user of child processes.',
    ),
    room(
      'routes-hold-no-queries',
      { path: '^server/features/.+\\.routes\\.ts$' },
      { path: 'node_modules/@mikro-orm|\\.entity\\.ts$' },
      'A route file is a table of contents.',
    ),
    room(
      's3-behind-its-adapter',
      { path: '^server/', pathNot: '^server/storage/|\\.test\\.ts$' },
      { path: 'node_modules/@aws-sdk' },
      'Hosted storage only through server/storage.',
    ),
    room(
      'mail-behind-its-adapter',
      { path: '^server/', pathNot: '^server/mail/|\\.test\\.ts$' },
      { path: 'node_modules/nodemailer' },
      'Mail only through server/mail.',
    ),
    room(
      'pdf-behind-its-adapter',
      { path: '^server/', pathNot: '^server/pdf/|\\.test\\.ts$' },
      { path: 'node_modules/pdfkit' },
      'Documents are written only through server/pdf.',
    ),
    room(
      'plots-use-d3-alone',
      { path: '^shared/plots/', pathNot: '\\.test\\.ts$' },
      { dependencyTypes: ['npm', 'npm-dev', 'core'], pathNot: 'node_modules/(@types/)?d3-' },
      'Geometry of plots, for pages and paper.',
    ),
  ],
  options: {
    doNotFollow: { path: 'node_modules' },
    tsPreCompilationDeps: true,
    tsConfig: { fileName: 'tsconfig.json' },
    enhancedResolveOptions: {
      exportsFields: ['exports'],
      conditionNames: ['import', 'require', 'node', 'default', 'types'],
      extensions: ['.ts', '.tsx', '.js', '.mjs', '.cjs', '.json', '.css'],
    },
  },
};
