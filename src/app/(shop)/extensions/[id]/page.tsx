import type { Metadata } from 'next'
import { ExtensionPage } from '@/components/extensions/extension-page'
import { getItemOfPage, type ItemPageProps, itemMetadata } from '../../item-of-page'

export function generateMetadata({ params }: ItemPageProps): Promise<Metadata> {
  return itemMetadata('extension', params)
}

export default async function Page({ params }: ItemPageProps) {
  return <ExtensionPage extension={await getItemOfPage('extension', params)} />
}
