import type { Metadata } from 'next'
import { HolderPage } from '@/components/holders/holder-page'
import { getItemOfPage, type ItemPageProps, itemMetadata } from '../../item-of-page'

export function generateMetadata({ params }: ItemPageProps): Promise<Metadata> {
  return itemMetadata('holder', params)
}

export default async function Page({ params }: ItemPageProps) {
  return <HolderPage holder={await getItemOfPage('holder', params)} />
}
