export interface MailSheetProps {
  subject: string
  text: string
  html: string | null
}

/** A mail as its reader sees it, in HTML and as text. The frame runs nothing and reaches nothing. */
export function MailSheet({ subject, text, html }: MailSheetProps) {
  return (
    <section aria-label={subject} className="border-ink bg-sheet border-t px-4 py-4 lg:px-6">
      <h2 className="text-lg">{subject}</h2>
      <div className="mt-3 grid gap-4 lg:grid-cols-2">
        {html ? (
          <iframe
            title={`${subject}, as HTML`}
            srcDoc={html}
            sandbox=""
            className="border-hairline h-96 w-full border bg-white"
          />
        ) : null}
        <pre className="border-hairline bg-ground border p-3 text-sm break-words whitespace-pre-wrap">
          {text}
        </pre>
      </div>
    </section>
  )
}
