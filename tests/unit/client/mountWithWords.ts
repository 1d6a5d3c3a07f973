import { mount, RouterLinkStub, type VueWrapper } from '@vue/test-utils'
import type { Component } from 'vue'
import { i18n } from '../../../src/plugins/i18n.ts'

/** Mounts a component with the messages and a link that goes nowhere; answers of `update:…` land in the props. */
export function mountWithWords(component: Component, props: Record<string, unknown> = {}, slots: Record<string, string> = {}): VueWrapper {
  return mount(component, { props, slots, attachTo: document.body, global: { plugins: [i18n], stubs: { RouterLink: RouterLinkStub } } })
}
