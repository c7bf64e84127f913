#!/bin/sh
# Builds what is missing or out of date, then becomes the server, so that signals reach it directly.
set -e
cd "$(dirname "$0")/../.."
node -e 'const [a, b] = process.versions.node.split(".").map(Number); if (a < 20 || (a === 20 && b < 9)) { console.error("Benchleaf needs Node.js 20.9 or newer; this is " + process.version + "."); process.exit(1); }'
stamp=dist/.built
if [ ! -f "$stamp" ] || [ -n "$(find src server shared index.html vite.config.ts package.json -newer "$stamp" -type f ! -name '*.test.ts' ! -name '*.test.tsx' -print -quit)" ]; then
  echo "Building Benchleaf ..."
  npm run --silent build
  touch "$stamp"
fi
exec node --enable-source-maps dist/server/main.js
