import { type NextRequest, NextResponse } from 'next/server'

const openPages = ['/sign-in', '/setup', '/invitation']
const sessionCookieName = 'leadline-session'

/** Gives each page its content security policy, and leads a browser without a session to the sign-in page. */
export function proxy(request: NextRequest): NextResponse {
  const { pathname, search } = request.nextUrl
  const isOpen = openPages.some((page) => pathname === page || pathname.startsWith(`${page}/`))
  if (!isOpen && !request.cookies.has(sessionCookieName)) {
    const target = request.nextUrl.clone()
    target.pathname = '/sign-in'
    target.search = pathname === '/' ? '' : `?next=${encodeURIComponent(pathname + search)}`
    return NextResponse.redirect(target)
  }
  const nonce = btoa(String.fromCharCode(...crypto.getRandomValues(new Uint8Array(18))))
  const policy = contentSecurityPolicy(nonce)
  const headers = new Headers(request.headers)
  headers.set('x-nonce', nonce)
  headers.set('content-security-policy', policy)
  headers.set('x-asked-page', pathname + search)
  const response = NextResponse.next({ request: { headers } })
  response.headers.set('content-security-policy', policy)
  response.headers.set('x-content-type-options', 'nosniff')
  response.headers.set('referrer-policy', 'same-origin')
  response.headers.set('permissions-policy', 'camera=(self), microphone=(), geolocation=()')
  if (request.headers.get('x-forwarded-proto') === 'https' || request.nextUrl.protocol === 'https:') {
    response.headers.set('strict-transport-security', 'max-age=31536000; includeSubDomains')
  }
  return response
}

function contentSecurityPolicy(nonce: string): string {
  // The development server evaluates modules it replaces; production never does.
  const evaluation = process.env.NODE_ENV === 'development' ? " 'unsafe-eval'" : ''
  return [
    "default-src 'self'",
    `script-src 'self' 'nonce-${nonce}' 'strict-dynamic'${evaluation}`,
    // The grid places its rows by inline styles.
    "style-src 'self' 'unsafe-inline'",
    "img-src 'self' data: blob:",
    "font-src 'self'",
    "connect-src 'self'",
    "object-src 'none'",
    "base-uri 'none'",
    "form-action 'self'",
    "frame-ancestors 'none'",
  ].join('; ')
}

export const config = {
  matcher: [
    { source: '/((?!api/|_next/static|_next/image|examples/|.*\\.(?:svg|ico|png|csv|webmanifest)$).*)' },
  ],
}
