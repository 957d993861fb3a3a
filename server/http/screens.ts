import { existsSync } from 'node:fs'
import path from 'node:path'
import express, { type RequestHandler } from 'express'

const yearSeconds = 31_536_000

/** The built screens: hashed assets kept for good, index.html for every other address. */
export function builtScreens(distDir: string): RequestHandler[] {
  const indexFile = path.join(distDir, 'index.html')
  return [
    express.static(distDir, {
      index: false,
      setHeaders(res, file) {
        const hashed = file.includes(`${path.sep}assets${path.sep}`)
        res.setHeader(
          'Cache-Control',
          hashed ? `public, max-age=${yearSeconds}, immutable` : 'no-cache',
        )
      },
    }),
    (req, res, next) => {
      // An asset of an older build is gone, not a screen.
      const isAsset = req.path.startsWith('/assets/')
      if (req.method !== 'GET' || isAsset || !existsSync(indexFile)) return next()
      res.setHeader('Cache-Control', 'no-cache')
      // By its folder: a dot in the path above it must not hide it.
      res.sendFile('index.html', { root: distDir })
    },
  ]
}
