import type { Metadata } from 'next'
import { CutterPage } from '@/components/cutters/cutter-page'
import { getItemOfPage, type ItemPageProps, itemMetadata } from '../../item-of-page'

export function generateMetadata({ params }: ItemPageProps): Promise<Metadata> {
  return itemMetadata('cutter', params)
}

export default async function Page({ params }: ItemPageProps) {
  return <CutterPage cutter={await getItemOfPage('cutter', params)} />
}
