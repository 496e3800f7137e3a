import { PageHeading } from '../layout/page-heading'
import { ButtonLink } from '../ui/button'
import { ExampleFiles } from './example-files'
import { UploadForm } from './upload-form'

export function NewImportPage() {
  return (
    <>
      <PageHeading
        title="Import a file"
        note="Any headings will do: what is not known you say once, and the shop keeps it."
      >
        <ButtonLink href="/imports" size="compact" variant="quiet">
          All imports
        </ButtonLink>
      </PageHeading>
      <div className="border-ink bg-sheet grid flex-1 gap-x-10 gap-y-8 border-t px-4 py-5 lg:grid-cols-[minmax(0,3fr)_minmax(18rem,1fr)] lg:px-6">
        <UploadForm />
        <ExampleFiles />
      </div>
    </>
  )
}
