import type { Metadata } from 'next'
import { ColletPage } from '@/components/collets/collet-page'
import { getItemOfPage, type ItemPageProps, itemMetadata } from '../../item-of-page'

export function generateMetadata({ params }: ItemPageProps): Promise<Metadata> {
  return itemMetadata('collet', params)
}

export default async function Page({ params }: ItemPageProps) {
  return <ColletPage collet={await getItemOfPage('collet', params)} />
}
